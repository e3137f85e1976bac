/** What comes back from a trace: always a number with its spread and remarks, or, when none exists, why not. */
import type { Unit } from '$lib/units/unit';
import type { ReadingKind, Side } from './reading-request';
import type { Remark } from './remark';

/** Where a level stands: frequency, or time in span 0. */
export interface Place {
	frequencyHz?: number;
	timeS?: number;
}
export interface Edges {
	lowerHz: number;
	upperHz: number;
}
export interface Harmonic {
	n: number;
	frequencyHz: number;
	levelDbm: number;
	dbc: number;
}
export interface AdjacentChannel {
	offsetHz: number;
	side: Side;
	levelDbm: number;
	dbc: number;
}

export interface PartsByKind {
	marker: Place;
	/** Differences are to − from. */
	delta: Place & { fromDbm: number; toDbm: number };
	peak: Place;
	'next-peak': Place;
	minimum: Place;
	'noise-density': undefined;
	'band-power': undefined;
	'channel-power': undefined;
	'power-density': undefined;
	'occupied-bandwidth': Edges;
	'x-db-bandwidth': Edges;
	/** In the order asked, lower before upper; the value is the worst dBc. */
	'adjacent-channel': AdjacentChannel[];
	/** The value is the strongest dBc. */
	harmonics: Harmonic[];
	thd: Harmonic[];
	/** Intercepts from the lower and the upper product; the value is the lower of the two. */
	intercept: { lowerDbm?: number; upperDbm?: number };
	'carrier-to-noise': { carrierDbm: number; noiseDbm: number };
	'phase-noise': { carrierDbm: number; carrierHz: number };
	'am-depth': { modulatingHz: number };
	'fm-deviation': { modulatingHz: number; index: number };
	pulse: { widthS: number; repetitionHz?: number };
	/** The value is the on time. */
	time: { onS: number; riseS?: number; fallS?: number; periodS?: number };
	/** `segment` counts from 0 in the order of the limits; a positive margin passes. */
	mask: { segment: number; frequencyHz: number; marginDb: number };
}

export interface ReadingOf<K extends ReadingKind> {
	kind: K;
	value: number;
	unit: Unit;
	/** One standard deviation of `value`, in `unit`, from the settings and how much of what is read behaves as noise. */
	spread: number;
	remarks: Remark[];
	parts?: PartsByKind[K];
}
export type Reading = { [K in ReadingKind]: ReadingOf<K> }[ReadingKind];

/** No number exists: what stands in the way, and what would help. */
export interface ReadingProblem {
	kind: ReadingKind;
	problem: string;
	needs: string;
}

export const isProblem = (outcome: Reading | ReadingProblem): outcome is ReadingProblem =>
	'problem' in outcome;
