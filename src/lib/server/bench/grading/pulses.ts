/** Pulses through the resolution filter: how much of one it lets through, and for how long. */
import type { EmitterOf } from '$lib/schemas/scene';
import { gaussianConstant } from '../receiver/resolution-filter';
import { normalIntegral } from '../signal/normal-integral';
import type { Context } from './mistake';

/** The train of pulses nearest to where a question asks; undefined where there is none. */
export function pulsesOf({ drawn, question }: Context): EmitterOf<'pulsed'> | undefined {
	const trains = drawn.scene.emitters.filter((emitter) => emitter.kind === 'pulsed');
	const away = ({ frequencyHz }: EmitterOf<'pulsed'>) => Math.abs(frequencyHz - question.frequencyHz);
	return trains.toSorted((a, b) => away(a) - away(b))[0];
}

/** Whether the filter takes pulses one by one; narrower than twice their repetition it sees their lines. */
export const isPulseByPulse = ({ periodS }: EmitterOf<'pulsed'>, rbwHz: number): boolean =>
	1 / periodS < rbwHz / 2;

/**
 * Voltage behind the filter at `timeS` from a pulse's middle, over what a filter wide enough would show: the Gaussian impulse response
 * exp(−π²t²/c) over the pulse, a difference of two normal integrals of deviation √(c/2)/π.
 */
export function throughFilter(widthS: number, rbwHz: number, timeS = 0): number {
	const deviationS = Math.sqrt(gaussianConstant(rbwHz) / 2) / Math.PI;
	return (
		normalIntegral((timeS + widthS / 2) / deviationS) - normalIntegral((timeS - widthS / 2) / deviationS)
	);
}

/** What a filter shows of a pulse's level, dB: 20 lg(1.505·B·τ) of short ones; of lines, 20 lg of the share of time. */
export function pulseLossDb(train: EmitterOf<'pulsed'>, rbwHz: number): number {
	const { widthS, periodS } = train;
	const share = isPulseByPulse(train, rbwHz) ? throughFilter(widthS, rbwHz) : widthS / periodS;
	return -20 * Math.log10(share);
}

const SAMPLES = 4000;

/**
 * How long a reading over time finds a pulse behind both filters, s: between the crossings of half the typical high level, which is the
 * median of what lies over half the greatest.
 */
export function shownWidthS(widthS: number, { rbwHz, vbwHz }: { rbwHz: number; vbwHz: number }): number {
	const startS = -widthS / 2 - 2 / rbwHz;
	const stepS = (widthS + 4 / rbwHz + 1 / vbwHz) / SAMPLES;
	const kept = Math.exp(-2 * Math.PI * vbwHz * stepS);
	let shown = 0;
	const voltages = Float64Array.from({ length: SAMPLES }, (_, i) => {
		shown = kept * shown + (1 - kept) * throughFilter(widthS, rbwHz, startS + i * stepS);
		return shown;
	});
	const top = voltages.reduce((a, b) => Math.max(a, b), 0);
	const highs = voltages.filter((voltage) => voltage >= top / 2).sort();
	const limit = highs[highs.length >> 1] / 2;
	return voltages.filter((voltage) => voltage >= limit).length * stepS;
}
