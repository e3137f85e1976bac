/** Laws of a bucket's average over a stretch long against 1/B: mean and variance on the trace's scale, then one draw. */
import type { Scale } from '$lib/schemas/settings';
import type { Random } from './random';
import { besselI0Scaled, besselI1Scaled, expIntegral } from './rice';

const EULER = 0.5772156649015329;
/** Independent values per 1/B: of power, of the logarithm, of the voltage, and of a line's beat with the noise. */
const POWER_PER_BT = 1.505384;
const LOG_PER_BT = 1.8459;
const VOLTAGE_PER_BT = 1.553;
const BEAT_PER_BT = 1.064467;

/** Mean of the video on the scale for noise of mean power v and a line of power p (both mW). */
export function meanOnScale(v: number, p: number, scale: Scale): number {
	if (scale === 'power') return v + p;
	const s = p / v;
	if (scale === 'log') return s < 1e-9 ? Math.log(v) - EULER : Math.log(p) + expIntegral(s);
	// Rice's mean amplitude: √(πv)/2·e^{−s/2}[(1+s)I₀(s/2) + s·I₁(s/2)]
	return 0.5 * Math.sqrt(Math.PI * v) * ((1 + s) * besselI0Scaled(s / 2) + s * besselI1Scaled(s / 2));
}

/** Variance of the average over bt (in 1/B); between noise alone and a strong line the smaller law rules, joined harmonically. */
export function varianceOnScale(v: number, p: number, scale: Scale, bt: number): number {
	if (scale === 'power') return (v * v) / (POWER_PER_BT * bt) + (2 * p * v) / (BEAT_PER_BT * bt);
	if (scale === 'log') {
		const noise = (Math.PI * Math.PI) / 6 / (LOG_PER_BT * bt);
		const beat = (2 * v) / p / (BEAT_PER_BT * bt);
		return p === 0 ? noise : 1 / (1 / noise + 1 / beat);
	}
	const noise = (v * (1 - Math.PI / 4)) / (VOLTAGE_PER_BT * bt);
	const beat = v / 2 / (BEAT_PER_BT * bt);
	const s = p / v;
	return (noise + s * beat) / (1 + s);
}

/** One average of the given mean and variance. Power and voltage are gamma; the log's skew is that of a gamma of 3.08·n values turned round. */
export function drawAverage(
	random: Random,
	mean: number,
	variance: number,
	scale: Scale,
	bt: number
): number {
	if (variance <= 0) return mean;
	if (scale === 'log') {
		const a = 3.08 * LOG_PER_BT * bt;
		return mean - (Math.sqrt(variance) * (random.gamma(a) - a)) / Math.sqrt(a);
	}
	const shape = (mean * mean) / variance;
	// a gamma this narrow is normal to within its own skew of 2/√shape
	if (shape > 1e5) return mean + Math.sqrt(variance) * random.normal();
	return (mean * random.gamma(shape)) / shape;
}
