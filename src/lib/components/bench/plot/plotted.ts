/** What stands on a plot besides traces. */
export interface PlottedMarker {
	letter: string;
	at: number;
	levelDbm: number;
	selected: boolean;
	/** Place in words, for the reader. */
	where: string;
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
