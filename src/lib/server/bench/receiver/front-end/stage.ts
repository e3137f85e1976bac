/** A nonlinear stage on the way: the device, the mixer. */
import type { Line } from '$lib/server/bench/signal/emitter-kind';
import { distort, type NonlinearLimits } from '$lib/server/bench/signal/nonlinearity';
import type { Arrival } from './arrival';
import { isSteady, type Carried, type CarriedDensity, type CarriedLine, type Origin } from './carried';

/**
 * What a stage makes of what is carried. Lines enter together, everything on at once. So do the densities that are always on;
 * one that comes and goes is bent alone, so that what it grows comes and goes with it.
 */
export function passStage(carried: Carried, limits: NonlinearLimits): Carried {
	if (limits.toiDbm === null && limits.shiDbm === null) return carried;
	const steady = carried.densities.filter(({ arrivals }) => arrivals.every(isSteady));
	const coming = carried.densities.filter(({ arrivals }) => !arrivals.every(isSteady));
	const together = distort(
		carried.lines,
		// What grew before is far below what it grew from: it passes, and takes no part.
		steady.filter(({ own }) => own).map(({ density }) => density),
		limits
	);
	return {
		lines: together.lines.map((line, i) => {
			const { frequencyHz, re, im, parents } = line;
			const origins = parents ? originsOf(line, parents, carried.lines) : carried.lines[i].origins;
			return { frequencyHz, re, im, origins };
		}),
		densities: [
			...bent(steady, together.densities, carried.lines),
			...coming.flatMap((one) =>
				one.own ? bent([one], distort([], [one.density], limits).densities, []) : [one]
			)
		]
	};
}

/** Densities that went in with what the stage has made of them, and what they grew. */
function bent(
	densities: CarriedDensity[],
	after: ReturnType<typeof distort>['densities'],
	lines: CarriedLine[]
): CarriedDensity[] {
	const entered = densities.filter(({ own }) => own);
	const passed = densities.filter(({ own }) => !own);
	const same = entered.map((one, i) => ({ ...one, density: after[i] }));
	const grown = after.slice(entered.length).map((density) => {
		const { parents } = density;
		const arrivals = new Set<Arrival>();
		for (const i of parents?.densities ?? [])
			for (const arrival of entered[i].arrivals) arrivals.add(arrival);
		for (const i of parents?.lines ?? []) for (const { arrival } of lines[i].origins) arrivals.add(arrival);
		return { density, finestHz: 0, gainAt: () => 1, arrivals: [...arrivals] };
	});
	return [...same, ...passed, ...grown];
}

/** Origins of a product: its parents', each as often as it counts, with the sign that gives the product's frequency. */
function originsOf(product: Line, parents: number[], lines: CarriedLine[]): Origin[] {
	const signs = signsOf(
		product.frequencyHz,
		parents.map((i) => lines[i].frequencyHz)
	);
	const orders = new Map<Arrival, number>();
	parents.forEach((parent, i) => {
		for (const { arrival, order } of lines[parent].origins)
			orders.set(arrival, (orders.get(arrival) ?? 0) + signs[i] * order);
	});
	return [...orders].map(([arrival, order]) => ({ arrival, order }));
}

/** +1 or −1 for each of two or three frequencies, so that they add up to `sumHz` as nearly as they can; the last is the one subtracted. */
function signsOf(sumHz: number, frequenciesHz: number[]): number[] {
	const all = frequenciesHz.map(() => 1);
	const lessLast = all.map((_, i) => (i === all.length - 1 ? -1 : 1));
	const mirrored = lessLast.map((sign) => -sign);
	const miss = (signs: number[]) =>
		Math.abs(sumHz - signs.reduce((sum, sign, i) => sum + sign * frequenciesHz[i], 0));
	return [lessLast, mirrored].reduce((best, signs) => (miss(signs) < miss(best) ? signs : best), all);
}
