/** How a receiver's detectors and holds make noise read, over its mean power. */
import type { SetUp } from './mistake';
import { normalIntegral } from '../signal/normal-integral';

/** Noise and impulse bandwidths of the Gaussian resolution filter over its 3 dB width. */
export const NOISE_BANDWIDTH = 1.064467;
const IMPULSE_BANDWIDTH = 1.50538;
/** Mean of a logarithm of exponential noise below the logarithm of its mean: 10·γ/ln 10, dB. */
export const LOG_AVERAGE_DB = 2.50682;

/** Whether decibels were averaged, by the detector, the video filter or over rows. */
export const averagesDecibels = ({ resolved, trace, sweeps }: SetUp): boolean =>
	resolved.scale === 'log' &&
	(resolved.detector === 'average' ||
		resolved.vbwHz < resolved.rbwHz ||
		(trace.mode === 'average' && sweeps > 1));

/** Resolution bandwidth times the time spent on one point. */
const bucketOf = ({ resolved }: SetUp): number =>
	(resolved.rbwHz * resolved.sweepTimeS) / (resolved.points - 1);

type Law = (x: number) => number;

/**
 * Cumulative laws of one point of one row, power over mean; a trace's points take them in turn.
 * Peaks within a bucket, bench.md §4: P(max < x) = (1 − e^−x)·exp(−1.5054·BΔt·√x/(e^x − 1)),
 * P(min < x) = 1 − exp(−x − 1.5054·BΔt·√x).
 */
function rowLaws(setUp: SetUp): Law[] {
	const bucket = bucketOf(setUp);
	const greatest: Law = (x) =>
		-Math.expm1(-x) * Math.exp((-IMPULSE_BANDWIDTH * bucket * Math.sqrt(x)) / Math.expm1(x));
	const least: Law = (x) => -Math.expm1(-x - IMPULSE_BANDWIDTH * bucket * Math.sqrt(x));
	switch (setUp.resolved.detector) {
		case 'positive-peak':
			return [greatest];
		case 'negative-peak':
			return [least];
		case 'rise-fall':
			return [greatest, least];
		case 'average':
			return [meanLaw(1 + NOISE_BANDWIDTH * bucket)];
		case 'sample':
			return [meanLaw(1)];
	}
}

/**
 * The same where least counts. About a null the power is |z|² + |ż|²t², and a pole at V sees ⟨t²⟩ = 2/(2π·V)²: what is left of a trough
 * is the sum of two exponentials, of mean 1 and of mean a = 2·(0.4247·B/V)², since ⟨|ż|²⟩ = (2π·0.4247·B)² for the Gaussian filter.
 */
function troughLaws(setUp: SetUp): Law[] {
	const { detector, scale } = setUp.resolved;
	const a = troughFill(setUp);
	if (detector !== 'sample' || scale !== 'power' || a >= 1) return rowLaws(setUp);
	return [(x) => 1 - (Math.exp(-x) - a * Math.exp(-x / a)) / (1 - a)];
}

const troughFill = ({ resolved: { rbwHz, vbwHz } }: SetUp): number => 2 * ((0.4247 * rbwHz) / vbwHz) ** 2;

/** Cumulative law of the mean of `degrees` independent exponentials (Wilson & Hilferty, PNAS 17, 684, 1931). */
function meanLaw(degrees: number): Law {
	if (degrees === 1) return (x) => -Math.expm1(-x);
	return (x) => normalIntegral((Math.cbrt(x) - (1 - 1 / (9 * degrees))) * Math.sqrt(9 * degrees));
}

/** Mean of the greatest of `count` draws from a law on [0, ∞): ∫(1 − Fᶜ). */
function meanOfGreatest(law: Law, count: number): number {
	const end = 30 + Math.log(count);
	const step = 0.01;
	let sum = 0.5;
	for (let x = step; x < end; x += step) sum += 1 - law(x) ** count;
	return sum * step;
}

/** Mean of the least of `count` draws: ∫(1 − F)ᶜ, on a scale that is fine where few are left. */
function meanOfLeast(law: Law, count: number): number {
	const steps = 2000;
	const end = 30;
	let sum = 0;
	for (let i = 0; i < steps; i++) {
		const [from, to] = [i, i + 1].map((n) => end * (n / steps) ** 3);
		sum += (to - from) * (1 - law((from + to) / 2)) ** count;
	}
	return sum;
}

const laws = new Map<string, number>();
function cached(key: string, make: () => number): number {
	const known = laws.get(key);
	if (known !== undefined) return known;
	const value = make();
	laws.set(key, value);
	return value;
}

/** Mean power that a set-up shows for noise of mean power 1: 1 unless it detects peaks or holds. */
export function shownPower(setUp: SetUp): number {
	const held = setUp.trace.mode === 'max-hold' || setUp.trace.mode === 'min-hold';
	const count = held ? Math.max(1, setUp.sweeps) : 1;
	const meanOf = setUp.trace.mode === 'min-hold' ? meanOfLeast : meanOfGreatest;
	const { detector } = setUp.resolved;
	if (count === 1 && (detector === 'average' || detector === 'sample')) return 1;
	const key = [
		detector,
		bucketOf(setUp).toPrecision(4),
		setUp.trace.mode,
		count,
		troughFill(setUp).toPrecision(4)
	];
	return cached(key.join(' '), () => {
		const laws = setUp.trace.mode === 'min-hold' ? troughLaws(setUp) : rowLaws(setUp);
		const powers = laws.map((law) => meanOf(law, count));
		return powers.reduce((sum, power) => sum + power, 0) / powers.length;
	});
}

const rowsOf = ({ trace, sweeps }: SetUp): number =>
	trace.mode === 'average' ? Math.max(1, Math.min(trace.count, sweeps)) : 1;

/** How many independent levels one point of a trace is the mean of. */
const metAtPoint = (setUp: SetUp): number =>
	rowsOf(setUp) * (setUp.resolved.detector === 'average' ? 1 + NOISE_BANDWIDTH * bucketOf(setUp) : 1);

/** Standard deviation in dB of one point of an averaged trace of noise: 5.57 dB of a single level, 10/ln 10 dB of a mean power, over √rows. */
export const pointSpreadDb = (setUp: SetUp): number =>
	(setUp.resolved.scale === 'log' ? 5.57 : 4.34) / Math.sqrt(metAtPoint(setUp));

/** Mean power of the highest point of a trace of noise of mean power 1: the greatest of as many as stand apart by more than a filter's memory. */
export function crestPower(setUp: SetUp): number {
	const { points } = setUp.resolved;
	const apart = Math.max(1, Math.round(points * Math.min(1, bucketOf(setUp))));
	const met = metAtPoint(setUp);
	return cached(`crest ${met.toPrecision(4)} ${apart}`, () => meanOfGreatest(meanLaw(met), apart));
}

/** Standard deviation in dB of a band's power read off a trace of noise: that of the mean of all that was met in the band. */
export function bandSpreadDb(setUp: SetUp, widthHz: number): number {
	const { resolved } = setUp;
	const dwellS = (resolved.sweepTimeS * widthHz) / resolved.spanHz;
	return 4.34 / Math.sqrt(Math.max(1, rowsOf(setUp) * dwellS * NOISE_BANDWIDTH * resolved.rbwHz));
}
