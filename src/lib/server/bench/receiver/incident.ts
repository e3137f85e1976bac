/**
 * What reaches the resolution filter: the scene after device, path, pad, attenuator, preamplifier, mixer and local oscillator,
 * scaled back to the connector (as the screen refers it, before correction and before the receiver's own level error).
 * Made once per (scene, profile, settings, attempt seed) by the front end; swept row after row by the sweep.
 */
import type { Emitter, Gate, Hop, PhaseNoisePoint } from '$lib/schemas/scene';

/** When an emitter is on and where it is. Absent = always on, fixed. Times are bench-clock seconds. */
export interface Timing {
	/** Index of the emitter in the scene: names its seeded hop order and gate phase. */
	emitter: number;
	gate?: Gate;
	hop?: Hop;
	driftHzPerS?: number;
	/** Pulse train of a `pulsed` emitter in pulse mode (PRF below B/2). */
	pulse?: { widthS: number; periodS: number };
}

/** A line: complex amplitude in √mW at bench clock 0 (phase advances at its own frequency). */
export interface IncidentLine {
	frequencyHz: number;
	re: number;
	im: number;
	/** Present when it comes and goes, hops, drifts or pulses: then it acts as bursts. */
	timing?: Timing;
	/** Phase-noise skirt (source and receiver summed in power) that acts as phase inside the filter; the density part beyond 3.5 B is in `variance`. */
	skirt?: PhaseNoisePoint[][];
}

/** A Gaussian process with the filter's own correlation: its variance against tuned frequency. */
export interface IncidentNoise {
	/** Mean power through the resolution filter tuned to `frequencyHz`, mW. */
	variance(frequencyHz: number): number;
	timing?: Timing;
	/** Set when the density is narrower than B/2: it then fades at its own width (3 dB, Hz), not the filter's. */
	ownWidthHz?: number;
	/** Shift of `variance` with a hop: the frequency it was computed for. */
	centreHz?: number;
}

/** A modulated waveform that must be made symbol by symbol. Amplitude factor multiplies the unit-power waveform. */
export interface IncidentEnvelope {
	emitter: Extract<Emitter, { kind: 'digital' | 'msk' | 'fm' | 'pm' | 'am' }>;
	index: number;
	frequencyHz: number;
	re: number;
	im: number;
	timing?: Timing;
}

export interface Incident {
	lines: IncidentLine[];
	/** The first is always the receiver's floor with every untimed density summed into it. */
	noises: IncidentNoise[];
	envelopes: IncidentEnvelope[];
	/** Total power at the mixer, pulse peaks included, dBm; and whether it is within 3 dB of compression. */
	mixerDbm: number;
	overload: boolean;
	/** Set when the input protection would trip: the power or the DC at the connector. */
	protection?: { reason: 'power' | 'dc'; connectorDbm: number; limitDbm: number };
}
