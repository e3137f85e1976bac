/** The scale that a trace is averaged on, and what noise reads there. */
import { dbmToMilliwatts } from '$lib/units/decibel';
import type { TraceScale } from './trace';

/** How far the average of noise lies under its power, dB: 10γ/ln 10 on dB, 10·log10(4/π) on √mW (Rice 1944). */
export const noiseBiasDb: Record<TraceScale, number> = {
	log: (10 * 0.5772156649015329) / Math.LN10,
	voltage: 10 * Math.log10(4 / Math.PI),
	power: 0
};

/** A level in dBm on the scale: dB, √mW or mW. */
export const toScale: Record<TraceScale, (levelDbm: number) => number> = {
	log: (levelDbm) => levelDbm,
	voltage: (levelDbm) => dbmToMilliwatts(levelDbm / 2),
	power: dbmToMilliwatts
};

/** Back from the scale to dBm. */
export const fromScale: Record<TraceScale, (value: number) => number> = {
	log: (value) => value,
	voltage: (value) => 20 * Math.log10(value),
	power: (value) => 10 * Math.log10(value)
};

/** Mean of levels `from` … `to` (included) on a scale, dBm. */
export function meanOnScaleDbm(
	levelsDbm: ArrayLike<number>,
	from: number,
	to: number,
	scale: TraceScale
): number {
	const convert = toScale[scale];
	let sum = 0;
	for (let i = from; i <= to; i++) sum += convert(levelsDbm[i]);
	return fromScale[scale](sum / (to - from + 1));
}
