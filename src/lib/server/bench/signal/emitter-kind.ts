/** What every kind of emitter must be able to say of itself. One file per kind in `kinds/`; `kinds.ts` lists them. */
import type { Emitter } from '$lib/schemas/scene';

/** A spectral line at t = 0 of the bench clock: complex amplitude in √mW, so re² + im² is power in mW. */
export interface Line {
	frequencyHz: number;
	re: number;
	im: number;
}

/** A stationary Gaussian-like spectrum, two-sided about nothing: power per hertz over absolute frequency. */
export interface Density {
	powerMw: number;
	/**
	 * Where the density is worth evaluating: all (but 1e-9) of the power lies inside. Only `multicarrier` has tails
	 * that fall too slowly for that: its support ends where the density is 100 dB under its top, about 1e-5 of the power
	 * is beyond, and `cumulative` stays exact there.
	 */
	startHz: number;
	stopHz: number;
	/** Power below `frequencyHz`, as a share of `powerMw`, 0 to 1, monotonic. */
	cumulative(frequencyHz: number): number;
	/** Power density in mW/Hz at `frequencyHz`. */
	densityMwPerHz(frequencyHz: number): number;
	/** Fourth-moment ratio E|x|⁴/P² of the waveform: 2 for Gaussian noise, 1 for constant envelope. */
	kurtosis: number;
	/** Whose regrowth it shows in a nonlinear stage, if the waveform isn't Gaussian. */
	regrowth?: { order: 2 | 4 | 16 | 64 | 256; rollOff: number; symbolRateHz: number } | 'none';
	/** Edges the integrators must not step over. */
	breaksHz: number[];
	/** Names the shape: two densities of one key differ at most in power. What is costly is remembered by it. */
	shapeKey: string;
}

/**
 * How an emitter acts through a resolution bandwidth (bench.md §1):
 * lines with true phases, bursts of lines, a Gaussian density, its own modulated envelope,
 * or quasi-static: a line whose instantaneous frequency moves slowly against the filter.
 */
export type Behaviour = 'lines' | 'density' | 'envelope' | 'quasi-static' | 'pulses';

/**
 * Initial phases in radians, drawn once per attempt for each emitter. With θ(t) = 2π·modulatingHz·t + modulationRad the
 * envelope is 1 + depth·cos θ for AM, the deviation Δf·cos θ for FM (phase β·sin θ), the phase Δφ·cos θ for PM;
 * a pulse is centred wherever 2πt/periodS + modulationRad is a whole turn.
 */
export interface EmitterPhases {
	carrierRad: number;
	modulationRad: number;
}

/** A stretch of spectrum, both ends included. */
export interface Band {
	startHz: number;
	stopHz: number;
}

export interface EmitterKind<E extends Emitter = Emitter> {
	readonly kind: E['kind'];
	/** Behaviour through a filter of 3 dB width `rbwHz`. */
	behaviour(emitter: E, rbwHz: number): Behaviour;
	/** Mean power while on, mW. */
	meanPowerMw(emitter: E): number;
	/** Peak envelope power while on, mW (a pulse's peak, AM's crest); what an input must survive. */
	peakPowerMw(emitter: E): number;
	/**
	 * Lines with power above 1e-12 of the whole, and inside `band` if one is given. Only for kinds that can act as lines.
	 * A pulse train without `band` gives only what lies within twenty nulls: its lines are too many to list.
	 */
	lines?(emitter: E, phases: EmitterPhases, band?: Band): Line[];
	/** Its density. Only for kinds that can act as one. */
	density?(emitter: E): Density;
}
