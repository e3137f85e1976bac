/** What stands on a plot besides traces. */
import type { MaskLimits } from '$lib/schemas/reading';

export interface PlottedMarker {
	letter: string;
	at: number;
	levelDbm: number;
	selected: boolean;
	/** Place in words, for the reader. */
	where: string;
	/** What it reads, for its note on the drawing; absent: no note. */
	note?: { figure: string; unit: string; where: string };
	/** The marker it is read from, how far away that is, and what lies between them in level. */
	delta?: { from: string; apart: string; difference: string };
}

export interface PlottedBand {
	id: string;
	start: number;
	stop: number;
	/** Index of the trace it lies under. */
	trace: number;
	figure: string;
	unit: string;
	what: string;
	/** What tells it from its like, shorter: "25 kHz". */
	detail: string;
}

export interface PlottedMask {
	limits: MaskLimits;
	/** Where the trace is worst over the limits, and by how much in words; absent: it isn't, or nobody has asked. */
	excess?: { at: number; levelDbm: number; words: string };
}
