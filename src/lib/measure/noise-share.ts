/** How much of what a window shows behaves as noise: a carrier's level is sure where a noise-like signal's is a matter of chance. */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { independentLag, pointSpreadDb, SINGLE_VALUE_DB } from './noise-statistics';
import type { Trace } from './trace';

/**
 * Share of the noise's deviation that points `from` … `to` (included) really show, 0 to 1, weighted by power.
 *
 * The third difference over four independent points, L₀ − 3L₁ + 3L₂ − L₃, is 0 on the flank of any line (a parabola in dB) and
 * has 20 times the variance of one point on noise. Above half of that the window is taken to be noise; far above it,
 * the points are too far apart to follow the lines, and the level over the window's median says how sure the top is.
 */
export function noiseShare(trace: Trace, from: number, to: number): number {
	const levels = trace.levelsDbm;
	const lag = Math.min(independentLag(trace), Math.floor((to - from) / 3));
	if (lag < 1) return 1;
	let roughness = 0;
	let weight = 0;
	// Relative to the highest level, so that the squares of powers stay within range.
	const topDbm = highest(levels, from, to);
	for (let i = from; i + 3 * lag <= to; i++) {
		const [a, b, c, d] = [levels[i], levels[i + lag], levels[i + 2 * lag], levels[i + 3 * lag]];
		const third = a - 3 * b + 3 * c - d;
		const power = dbmToMilliwatts((b + c) / 2 - topDbm);
		roughness += (power * third) ** 2;
		weight += power * power;
	}
	const pointDb = pointSpreadDb(trace);
	// Single values of noise stray downwards most, where their weight is least: that leaves a third of the variance.
	const seen = 1 - 0.67 * (pointDb / SINGLE_VALUE_DB) ** 2;
	const share = roughness / (20 * pointDb ** 2 * weight);
	if (!(share <= 4)) return shareOverMedian(levels, from, to, topDbm);
	return share > 0.5 * seen ? 1 : Math.sqrt(share);
}

/** Whether a share is more noise than line. */
export const isNoiseLike = (share: number): boolean => share > 0.5;

/** Noise beside a line moves its level by √(2·noise/line) of what it moves by alone. */
function shareOverMedian(levels: ArrayLike<number>, from: number, to: number, topDbm: number): number {
	const sorted = Array.from({ length: to - from + 1 }, (_, i) => levels[from + i]).sort((a, b) => a - b);
	return Math.min(1, Math.sqrt(2 * dbmToMilliwatts(sorted[sorted.length >> 1] - topDbm)));
}

function highest(levels: ArrayLike<number>, from: number, to: number): number {
	let top = levels[from];
	for (let i = from + 1; i <= to; i++) if (levels[i] > top) top = levels[i];
	return top;
}
