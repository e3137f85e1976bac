/**
 * Single-sideband phase noise L(f): straight in dB over log offset between its points, level below the first,
 * level from the last to ten times its offset, nothing beyond. The same on both sides.
 */
import type { PhaseNoisePoint } from '$lib/schemas/scene';
import { BenchError } from '$lib/server/bench/bench-error';
import type { Density } from './emitter-kind';

/** Above this the small-angle picture (skirts in quadrature with their carrier) no longer holds, rad². */
const LARGEST_INTEGRAL = 0.1;
/** The level stretch after the last point ends at this many times its offset. */
const REACH = 10;

const linear = (dbcPerHz: number): number => 10 ** (dbcPerHz / 10);

/** One stretch: L = height·(f/fromHz)^slope for fromHz ≤ f ≤ toHz, and ∫L up to its start. */
interface Stretch {
	fromHz: number;
	toHz: number;
	height: number;
	slope: number;
	below: number;
}

function stretchesOf(points: readonly PhaseNoisePoint[]): Stretch[] {
	const last = points[points.length - 1];
	const knots = [...points, { offsetHz: REACH * last.offsetHz, dbcPerHz: last.dbcPerHz }];
	let below = linear(points[0].dbcPerHz) * points[0].offsetHz;
	return points.map((point, i) => {
		const next = knots[i + 1];
		const slope = (next.dbcPerHz - point.dbcPerHz) / (10 * Math.log10(next.offsetHz / point.offsetHz));
		const stretch = {
			fromHz: point.offsetHz,
			toHz: next.offsetHz,
			height: linear(point.dbcPerHz),
			slope,
			below
		};
		below += areaOf(stretch, next.offsetHz);
		return stretch;
	});
}

/** ∫ of the power law from its start to `toHz`, by its primitive; ln where the exponent is −1. */
function areaOf({ fromHz, height, slope }: Stretch, toHz: number): number {
	const log = Math.log(toHz / fromHz);
	const exponent = slope + 1;
	// expm1 keeps exponents near 0 exact.
	const shape = Math.abs(exponent) < 1e-12 ? log : Math.expm1(exponent * log) / exponent;
	return height * fromHz * shape;
}

/** L at `offsetHz` ≥ 0 from the carrier, 1/Hz. */
export function phaseNoiseAt(points: readonly PhaseNoisePoint[], offsetHz: number): number {
	const last = points[points.length - 1];
	if (offsetHz > REACH * last.offsetHz) return 0;
	if (offsetHz >= last.offsetHz) return linear(last.dbcPerHz);
	if (offsetHz <= points[0].offsetHz) return linear(points[0].dbcPerHz);
	let i = 0;
	while (points[i + 1].offsetHz < offsetHz) i++;
	const share =
		Math.log(offsetHz / points[i].offsetHz) / Math.log(points[i + 1].offsetHz / points[i].offsetHz);
	return linear(points[i].dbcPerHz + share * (points[i + 1].dbcPerHz - points[i].dbcPerHz));
}

/** ∫₀^offset L(f)df of one side in closed form, as a function of `offsetHz` ≥ 0. Prepared once for many offsets. */
export function phaseNoiseIntegral(points: readonly PhaseNoisePoint[]): (offsetHz: number) => number {
	const stretches = stretchesOf(points);
	const first = stretches[0];
	return (offsetHz) => {
		if (offsetHz <= first.fromHz) return first.height * Math.max(0, offsetHz);
		let i = stretches.length - 1;
		while (stretches[i].fromHz > offsetHz) i--;
		const stretch = stretches[i];
		return stretch.below + areaOf(stretch, Math.min(offsetHz, stretch.toHz));
	};
}

/**
 * σ² = 2∫L(f)df over all offsets, rad²: the mean square phase (IEEE Std 1139).
 * @throws BenchError naming `field` above 0.1 rad²
 */
export function integratedPhaseNoise(points: readonly PhaseNoisePoint[], field = 'phaseNoise'): number {
	const total = 2 * phaseNoiseIntegral(points)(Infinity);
	if (total > LARGEST_INTEGRAL)
		throw new BenchError(
			field,
			`${field}: its two-sided integral is ${total.toPrecision(3)} rad², the limit is ${LARGEST_INTEGRAL}`
		);
	return total;
}

/** How far the skirts reach from the carrier, Hz. */
export const phaseNoiseReachHz = (points: readonly PhaseNoisePoint[]): number =>
	REACH * points[points.length - 1].offsetHz;

/**
 * The skirts of a carrier as a density: what exp(−σ²) leaves over of `carrierMw` (the total), in the shape of L,
 * so that line and skirts together are `carrierMw` exactly.
 */
export function phaseNoiseDensity(
	frequencyHz: number,
	carrierMw: number,
	points: readonly PhaseNoisePoint[]
): Density {
	const variance = integratedPhaseNoise(points);
	const powerMw = -Math.expm1(-variance) * carrierMw;
	const integral = phaseNoiseIntegral(points);
	const reachHz = phaseNoiseReachHz(points);
	const knots = [...points.map((p) => p.offsetHz), reachHz];
	return {
		powerMw,
		startHz: frequencyHz - reachHz,
		stopHz: frequencyHz + reachHz,
		cumulative(atHz) {
			const side = integral(Math.abs(atHz - frequencyHz)) / variance;
			return atHz >= frequencyHz ? 0.5 + side : 0.5 - side;
		},
		densityMwPerHz: (atHz) => (powerMw / variance) * phaseNoiseAt(points, Math.abs(atHz - frequencyHz)),
		kurtosis: 2,
		breaksHz: [
			...knots.map((k) => frequencyHz - k).reverse(),
			frequencyHz,
			...knots.map((k) => frequencyHz + k)
		],
		shapeKey: `phase-noise ${frequencyHz} ${points.map((p) => `${p.offsetHz}:${p.dbcPerHz}`).join(' ')}`
	};
}
