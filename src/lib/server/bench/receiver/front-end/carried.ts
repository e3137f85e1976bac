/** What travels along the chain from the reference plane to the resolution filter. */
import type { Density, Line } from '$lib/server/bench/signal/emitter-kind';
import type { Arrival } from './arrival';

/** An emitter in a line's making, and how often: +1 for itself, 2 in its second harmonic, −1 where it was subtracted. */
export interface Origin {
	arrival: Arrival;
	order: number;
}

export interface CarriedLine extends Line {
	origins: Origin[];
}

export interface CarriedDensity {
	/** As it left the reference plane; `gain` is what the chain has done to it since, a complex amplitude. */
	density: Density;
	gain: { re: number; im: number };
	/** Whose it is: its own spectrum, or what it grew. */
	arrivals: Arrival[];
	isOwn: boolean;
}

export interface Carried {
	lines: CarriedLine[];
	densities: CarriedDensity[];
}

/** Everything at the reference plane, before any device. */
export function carriedFrom(arrivals: readonly Arrival[]): Carried {
	return {
		lines: arrivals.flatMap((arrival) =>
			arrival.lines.map((line) => ({ ...line, origins: [{ arrival, order: 1 }] }))
		),
		densities: arrivals.flatMap((arrival) =>
			arrival.density
				? [{ density: arrival.density, gain: { re: 1, im: 0 }, arrivals: [arrival], isOwn: true }]
				: []
		)
	};
}
