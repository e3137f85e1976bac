/** What travels along the chain from the reference plane to the resolution filter. */
import type { Emitter } from '$lib/schemas/scene';
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
	/** Its spectrum as it is here, but for a connection that is not the same at all its frequencies. */
	density: Density;
	/** Width of its finest detail between breaks, Hz; 0 where nothing is known of it. */
	finestHz: number;
	/** Power gain that each frequency still has to be multiplied by. */
	gainAt(frequencyHz: number): number;
	/** Whose spectrum it is; absent on one that grew. */
	own?: Arrival;
	/** What it is made of. */
	arrivals: Arrival[];
}

export interface Carried {
	lines: CarriedLine[];
	densities: CarriedDensity[];
}

const unchanged = () => 1;

/** Everything at the reference plane, before any device. */
export function carriedFrom(arrivals: readonly Arrival[]): Carried {
	return {
		lines: arrivals.flatMap((arrival) =>
			arrival.lines.map((line) => ({ ...line, origins: [{ arrival, order: 1 }] }))
		),
		densities: arrivals.flatMap((arrival) =>
			arrival.density
				? [
						{
							density: arrival.density,
							finestHz: finestDetailHz(arrival.emitter),
							gainAt: unchanged,
							own: arrival,
							arrivals: [arrival]
						}
					]
				: []
		)
	};
}

/** Width of the finest detail between the breaks of an emitter's density, Hz. */
function finestDetailHz(emitter: Emitter): number {
	if (emitter.kind === 'noise') return Infinity;
	if (emitter.kind === 'digital') return emitter.rollOff * emitter.symbolRateHz;
	if (emitter.kind === 'msk') return emitter.bitRateHz / 2;
	if (emitter.kind === 'multicarrier') return emitter.spacingHz;
	return 0;
}

/** Whether an emitter is there all the time, as far as the filter can tell. */
export const isSteady = (arrival: Arrival): boolean => !arrival.timing && arrival.trains.length === 0;

/**
 * The emitter whose comings and goings something made of several follows: of those that come and go, the one least often on.
 * (A product needs all of its parents on; two schedules at once are more than a timing can say.)
 */
export function pacemaker(arrivals: readonly Arrival[]): Arrival | undefined {
	const coming = arrivals.filter((arrival) => !isSteady(arrival));
	return coming.reduce<Arrival | undefined>(
		(rarest, arrival) => (!rarest || onShare(arrival) < onShare(rarest) ? arrival : rarest),
		undefined
	);
}

function onShare({ timing, duty }: Arrival): number {
	const gate = timing?.gate ? timing.gate.onS / (timing.gate.onS + timing.gate.offS) : 1;
	const pulse = timing?.pulse ? timing.pulse.widthS / timing.pulse.periodS : 1;
	return duty * gate * pulse;
}
