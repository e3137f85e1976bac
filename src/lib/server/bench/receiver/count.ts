/** The frequency counter: the receiver stands on one frequency and follows the phase of what comes through for a gate time. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Scene } from '$lib/schemas/scene';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { turns } from './contribution';
import { prepareIncident } from './front-end/prepare-incident';
import type { Incident } from './incident';
import { passing } from './line-contribution';
import { makeFrame } from './frame';
import { Random, type Seed } from './random';
import { drawReceiverError } from './receiver-error';
import { Schedule } from './schedule';

export interface CountRequest {
	/** Where the counter is put, as the screen shows it, Hz. */
	atHz: number;
	gateS: number;
}
export interface Count {
	kind: 'count';
	/** Counted frequency as shown: true·(1 + ε), Hz. */
	value: number;
	unit: 'Hz';
	/** √6/(2π·gate·√(SNR·B·gate)), Hz: the slope of a regression over B·gate independent phases. */
	spread: number;
	remarks: { code: string; text: string }[];
}
export interface CountProblem {
	kind: 'count';
	problem: string;
	needs: string;
}

/** A line must stand this far over the noise in B to be counted. */
const LEAST_SNR_DB = 20;
const MOST_INSTANTS = 2048;

/**
 * Counts on the bench clock, with every line and the noise inside the resolution bandwidth.
 * @param row the number of the row the count comes before: names its chance
 */
export function countFrequency(
	scene: Scene,
	profile: ReceiverProfile,
	settings: ResolvedSettings,
	seed: Seed,
	request: CountRequest,
	row: number,
	clockS: number
): Count | CountProblem {
	const error = drawReceiverError(profile, seed);
	const tuned: ResolvedSettings = {
		...settings,
		startHz: request.atHz,
		stopHz: request.atHz,
		centreHz: request.atHz,
		spanHz: 0,
		sweepTimeS: request.gateS
	};
	const incident = prepareIncident(scene, profile, tuned, seed);
	if (incident.protection)
		return {
			kind: 'count',
			problem: 'the input has protected itself',
			needs: 'less level at the connector, then a reset'
		};
	const tunedHz = request.atHz / (1 + error.frequency);
	const lines = linesInside(incident, tuned, error.frequency, seed, clockS, request.gateS);
	const noiseMw = noiseInside(incident, tunedHz, settings.rbwHz);
	const main = lines.reduce((best, line) => (line.powerMw > (best?.powerMw ?? 0) ? line : best), lines[0]);
	if (!main || 10 * Math.log10(main.powerMw / noiseMw) < LEAST_SNR_DB)
		return {
			kind: 'count',
			problem: `no single line stands ${LEAST_SNR_DB} dB above its surroundings here`,
			needs: 'a narrower resolution bandwidth, or another place'
		};
	const offsetHz = regress(
		main,
		lines,
		noiseMw,
		settings.rbwHz,
		request.gateS,
		new Random(seed, row, 'count')
	);
	const snr = main.powerMw / noiseMw;
	const beside = lines.reduce((sum, line) => sum + line.powerMw, 0) - main.powerMw;
	const remarks =
		beside > main.powerMw / 100
			? [
					{
						code: 'other-carrier-inside',
						text: 'Another carrier stands inside the resolution bandwidth: narrow it to count one alone.'
					}
				]
			: [];
	return {
		kind: 'count',
		value: (tunedHz + main.offsetHz + offsetHz) * (1 + error.frequency),
		unit: 'Hz',
		spread: Math.sqrt(6) / (2 * Math.PI * request.gateS * Math.sqrt(snr * settings.rbwHz * request.gateS)),
		remarks
	};
}

interface CountedLine {
	/** From the tuned frequency at the gate's start, Hz; and how it moves. */
	offsetHz: number;
	driftHzPerS: number;
	powerMw: number;
	phaseRad: number;
	isOn(t: number): boolean;
}

function linesInside(
	incident: Incident,
	settings: ResolvedSettings,
	frequencyError: number,
	seed: Seed,
	clockS: number,
	gateS: number
): CountedLine[] {
	const frame = makeFrame(settings, frequencyError, 2);
	return incident.lines.flatMap((line) => {
		const t = line.timing;
		const comesAndGoes = t && (t.gate || t.hop || t.pulse);
		const stretches = comesAndGoes ? new Schedule(t, seed).stretches(clockS, clockS + gateS) : [];
		const channels = comesAndGoes ? [...new Set(stretches.map((s) => s.channelHz))] : [undefined];
		return channels.map((channelHz) => {
			const pass = passing(line, frame, clockS, channelHz);
			const gain = Math.exp(-2 * frame.c * pass.offsetHz ** 2);
			const on = stretches.filter((s) => s.channelHz === channelHz);
			return {
				offsetHz: pass.offsetHz,
				driftHzPerS: -pass.passingHzPerS,
				powerMw: (pass.re * pass.re + pass.im * pass.im) * gain,
				phaseRad: Math.atan2(pass.im, pass.re),
				isOn: (s: number) => !comesAndGoes || on.some((q) => q.startS <= clockS + s && q.stopS > clockS + s)
			};
		});
	});
}

/** Noise in B, with modulated envelopes counted as what they are to a counter: noise. */
function noiseInside(incident: Incident, tunedHz: number, rbwHz: number): number {
	const noise = incident.noises.reduce((sum, n) => sum + n.variance(tunedHz), 0);
	return incident.envelopes.reduce((sum, e) => {
		const half =
			'symbolRateHz' in e.emitter
				? e.emitter.symbolRateHz
				: 'bitRateHz' in e.emitter
					? e.emitter.bitRateHz
					: 0;
		return Math.abs(e.frequencyHz - tunedHz) < rbwHz + half ? sum + e.re * e.re + e.im * e.im : sum;
	}, noise);
}

/** Least-squares slope of the phase about the main line's own rotation, in Hz. */
function regress(
	main: CountedLine,
	lines: CountedLine[],
	noiseMw: number,
	rbwHz: number,
	gateS: number,
	random: Random
): number {
	const independent = rbwHz * gateS;
	const count = Math.max(16, Math.min(MOST_INSTANTS, Math.round(4 * independent)));
	// fewer (or more) instants than independent phases: each stands for as many as keeps the slope's spread
	const deviation = Math.sqrt((noiseMw / 2 / main.powerMw) * (count / independent));
	let st = 0;
	let stt = 0;
	let sp = 0;
	let stp = 0;
	let last = 0;
	for (let i = 0; i < count; i++) {
		// jittered instants, so that no beat hides behind a regular step
		const t = ((i + random.uniform()) / count) * gateS;
		let x = deviation * random.normal();
		let y = deviation * random.normal();
		for (const line of lines) {
			if (!line.isOn(t)) continue;
			const beat =
				line === main ? 0 : turns((line.offsetHz - main.offsetHz) * t) + line.phaseRad - main.phaseRad;
			const bend = Math.PI * line.driftHzPerS * t * t;
			const a = Math.sqrt(line.powerMw / main.powerMw);
			x += a * Math.cos(beat + bend);
			y += a * Math.sin(beat + bend);
		}
		const wrapped = Math.atan2(y, x);
		const phase = wrapped + 2 * Math.PI * Math.round((last - wrapped) / (2 * Math.PI));
		last = phase;
		st += t;
		stt += t * t;
		sp += phase;
		stp += t * phase;
	}
	return (count * stp - st * sp) / (count * stt - st * st) / (2 * Math.PI);
}
