/** How each trace is drawn: a colour and a dash, so that neither carries the meaning alone. */
export interface TraceStyle {
	/** The colour token's name, without its dashes. */
	token: 'blue' | 'madder' | 'verdigris' | 'plum';
	widthPx: number;
	dashPx: readonly number[];
	cap: 'butt' | 'round';
}

const styles: readonly TraceStyle[] = [
	{ token: 'blue', widthPx: 1.5, dashPx: [], cap: 'round' },
	{ token: 'madder', widthPx: 1, dashPx: [5, 2], cap: 'butt' },
	{ token: 'verdigris', widthPx: 1.75, dashPx: [9, 4], cap: 'butt' },
	{ token: 'plum', widthPx: 1.5, dashPx: [1.5, 3], cap: 'round' }
];

/** Style of trace `index`, counted from 0; at most four traces exist. */
export const traceStyle = (index: number): TraceStyle => styles[index % styles.length];
