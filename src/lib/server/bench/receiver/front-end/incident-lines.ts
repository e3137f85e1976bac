/** Lines as the filter meets them: modulation and trains resolved, comings and goings named, skirts attached. */
import type { PhaseNoisePoint } from '$lib/schemas/scene';
import type { Band, Line } from '$lib/server/bench/signal/emitter-kind';
import type { IncidentLine, Timing } from '../incident';
import type { Arrival } from './arrival';
import type { CarriedLine } from './carried';
import { timingOf } from './line-timing';
import { isMoving } from './moving-line';
import { resolveLine } from './resolve-line';
import type { PhaseNoise } from './skirt-shape';

/** A swept line with what its skirts hold. */
export interface ArrivedLine {
	line: IncidentLine;
	/** Skirts that ride on it, each with the power that L is counted from. */
	skirts: { noise: PhaseNoise; powerMw: number }[];
	/** What it is made of. */
	arrivals: Arrival[];
}

/**
 * Lines that the sweep will follow.
 * @param band tuned frequencies with everything the filter can see from them; lines that stay put outside it are left out
 * @param receiver the local oscillator's phase noise, on every line
 */
export function incidentLines(
	lines: readonly CarriedLine[],
	band: Band,
	receiver: PhaseNoise | null
): { swept: IncidentLine[]; arrived: ArrivedLine[] } {
	const swept: IncidentLine[] = [];
	const arrived: ArrivedLine[] = [];
	for (const carried of lines) {
		const timing = timingOf(carried);
		const staysPut = timing?.hop === undefined && timing?.driftHzPerS === undefined;
		// Lines out of sight still have skirts that reach in.
		for (const line of resolveLine(carried, staysPut ? band : undefined)) {
			const one = arrive(line, carried, timing, receiver);
			arrived.push(one);
			// One that moves by modulation is an envelope's business; its skirts are counted here all the same.
			if (!isMoving(carried) && !(staysPut && isOutside(line, band))) swept.push(one.line);
		}
	}
	return { swept, arrived };
}

const isOutside = ({ frequencyHz }: Line, { startHz, stopHz }: Band) =>
	frequencyHz < startHz || frequencyHz > stopHz;

/** Through the local oscillator: the line loses what its skirts take. */
function arrive(
	{ frequencyHz, re, im }: Line,
	{ origins }: CarriedLine,
	timing: Timing | undefined,
	receiver: PhaseNoise | null
): ArrivedLine {
	const lineMw = re * re + im * im;
	const sources = origins.flatMap(({ arrival: { phaseNoise }, order }) =>
		phaseNoise && order !== 0 ? [{ noise: phaseNoise, times: order * order }] : []
	);
	// L is counted from the whole carrier, of which the line is what the skirts have left.
	const carrierMw = sources.reduce((power, { noise }) => power / noise.lineShare, lineMw);
	const share = receiver ? Math.sqrt(receiver.lineShare) : 1;
	const points = [
		...sources.map(({ noise, times }) => multiplied(noise.points, times)),
		...(receiver ? [receiver.points] : [])
	];
	return {
		line: {
			frequencyHz,
			re: re * share,
			im: im * share,
			...(timing && { timing }),
			...(points.length > 0 && { skirt: points })
		},
		skirts: [
			...sources.map(({ noise, times }) => ({ noise, powerMw: times * carrierMw })),
			...(receiver ? [{ noise: receiver, powerMw: carrierMw }] : [])
		],
		arrivals: origins.map(({ arrival }) => arrival)
	};
}

/** A product that holds a carrier n times has n times its phase: 20·lg n dB more phase noise. */
const multiplied = (points: PhaseNoisePoint[], times: number): PhaseNoisePoint[] =>
	times === 1
		? points
		: points.map(({ offsetHz, dbcPerHz }) => ({ offsetHz, dbcPerHz: dbcPerHz + 10 * Math.log10(times) }));
