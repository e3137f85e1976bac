const THIN_SPACE = '\u2009';

/** A number for people: fixed decimals, thin spaces every three digits before the point, a real minus: −16 000.0 */
export function figure(value: number, digits: number): string {
	const [whole, decimals] = Math.abs(value).toFixed(digits).split('.');
	const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
	const magnitude = decimals ? `${grouped}.${decimals}` : grouped;
	return value < 0 && Number(value.toFixed(digits)) !== 0 ? `−${magnitude}` : magnitude;
}

/** The same with its sign always there: +3.2, −0.4. */
export const signedFigure = (value: number, digits: number): string =>
	Number(value.toFixed(digits)) > 0 ? `+${figure(value, digits)}` : figure(value, digits);

/** Digits enough to tell a value as it was set, at most `most`: 4.3 → "4.3", 25 → "25". */
export const shortFigure = (value: number, most = 6): string => {
	const digits = Number(value.toFixed(most)).toString().split('.')[1]?.length ?? 0;
	return figure(value, digits);
};

const SCALES = [
	{ unit: 'GHz', factor: 1e9 },
	{ unit: 'MHz', factor: 1e6 },
	{ unit: 'kHz', factor: 1e3 }
];

/** A frequency or width in the unit people would use: 450.0375 MHz, 25 kHz, 300 Hz. */
export function hertz(valueHz: number): string {
	const scale = SCALES.find(({ factor }) => Math.abs(valueHz) >= factor) ?? { unit: 'Hz', factor: 1 };
	return `${shortFigure(valueHz / scale.factor, 6)} ${scale.unit}`;
}
