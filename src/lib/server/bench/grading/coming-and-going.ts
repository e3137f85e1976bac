/** What a set-up shows where something comes and goes: with it, without it, and how much of the time it is there. */
import { dbToPowerRatio, milliwattsToDbm } from '$lib/units/decibel';
import type { Gate } from '$lib/schemas/scene';
import { placeEmitters } from '../truth/place-emitters';
import { spectrumOf, weightedPowerBetween } from '../truth/spectrum';
import type { Context, SetUp } from './mistake';
import { noiseMw } from './noise-in-reading';

/** How far the filter is followed, in its own widths: 60 dB down is at 2.2. */
const REACH = 3;
/** Retrace between two sweeps, s: 10 ms and up to 10 ms more. */
const RETRACE_S = 0.015;

export interface ComingAndGoing {
	/** Through the resolution filter, at the reference plane, dBm: while on, where it stands; while off, at the frequency asked. */
	onDbm: number;
	offDbm: number;
	gate: Gate;
	/** Share of the time it is on. */
	share: number;
}

/** Null where nothing comes and goes within the filter. */
export function comingAndGoing(context: Context, setUp: SetUp): ComingAndGoing | null {
	const { drawn, question } = context;
	const { rbwHz } = setUp.resolved;
	const atHz = question.frequencyHz;
	const placed = placeEmitters(drawn.scene, { kind: 'marker', atHz });
	const gated = placed.flatMap(({ emitter }) =>
		'gate' in emitter && emitter.gate && Math.abs(emitter.frequencyHz - atHz) < rbwHz
			? [{ gate: emitter.gate, frequencyHz: emitter.frequencyHz }]
			: []
	);
	if (gated.length === 0) return null;
	const through = (emitters: typeof placed, tunedHz: number): number =>
		weightedPowerBetween(
			spectrumOf(emitters, drawn.scene.device),
			tunedHz - REACH * rbwHz,
			tunedHz + REACH * rbwHz,
			(frequencyHz) => 2 ** -(((2 * (frequencyHz - tunedHz)) / rbwHz) ** 2),
			[]
		);
	const noise = noiseMw(context, setUp, 'point');
	const always = placed.filter(({ emitter }) => !('gate' in emitter && emitter.gate));
	const [{ gate, frequencyHz }] = gated;
	return {
		onDbm: milliwattsToDbm(through(placed, frequencyHz) + noise),
		offDbm: milliwattsToDbm(through(always, atHz) + noise),
		gate,
		share: gate.onS / (gate.onS + gate.offS)
	};
}

/** Whether a level is that of the burst, on this side of the middle between the two, in dB. */
export const isBurst = (levelDbm: number, { onDbm, offDbm }: ComingAndGoing): boolean =>
	levelDbm > (onDbm + offDbm) / 2;

/** How far noise moves a point that shows a carrier, dB: its part in phase with the carrier, of half its power, as a share of the voltage. */
export const carrierSpreadDb = (context: Context, setUp: SetUp, levelDbm: number): number =>
	8.686 * Math.sqrt(noiseMw(context, setUp, 'point') / (2 * dbToPowerRatio(levelDbm)));

/** Mean of many sweeps over the burst and its silence, on the scale of the trace, dBm. */
export function averagedDbm({ onDbm, offDbm, share }: ComingAndGoing, { resolved }: SetUp): number {
	const mean = (on: number, off: number) => share * on + (1 - share) * off;
	switch (resolved.scale) {
		case 'log':
			return mean(onDbm, offDbm);
		case 'power':
			return milliwattsToDbm(mean(dbToPowerRatio(onDbm), dbToPowerRatio(offDbm)));
		case 'voltage':
			return 2 * milliwattsToDbm(mean(dbToPowerRatio(onDbm / 2), dbToPowerRatio(offDbm / 2)));
	}
}

/**
 * How far such a mean strays, dB: bursts begun and not ended at either end (a third of one, 1/√12 at each), and in every burst
 * one sweep more or less, or where sweeps are rarer than that, none.
 */
export function averagedSpreadDb(one: ComingAndGoing, { resolved, trace, sweeps }: SetUp): number {
	const cycleS = resolved.sweepTimeS + RETRACE_S;
	const bursts = (Math.min(trace.count, sweeps) * cycleS) / (one.gate.onS + one.gate.offS);
	const hits = one.gate.onS / cycleS;
	const oneMore = hits < 1 ? Math.sqrt(hits * (1 - hits)) : 0.5;
	const relative = Math.hypot(0.4 / bursts, oneMore / hits / Math.sqrt(bursts));
	return 4.34 * relative;
}
