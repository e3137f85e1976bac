/** The figure of the front page: the same carriers swept through a wide and through a narrow resolution. */
export interface FrontFigure {
	centreHz: number;
	spanHz: number;
	/** Level at the top line, dBm. */
	referenceDbm: number;
	/** The two carriers whose distance is drawn, from the centre, Hz. */
	carriersHz: [number, number];
	/** Each sweep's resolution bandwidth and levels, evenly spaced over the span. */
	sweeps: { rbwHz: number; levelsDbm: number[] }[];
}
