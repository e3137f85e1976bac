import { formatFigure } from '$lib/units/format-quantity';

const THIN_SPACE = '\u202f';

/** A number for people: fixed decimals, thin spaces every three digits from 10 000 up, a true minus: −16 000.0 */
export function figure(value: number, digits: number): string {
	const [whole, decimals] = formatFigure(value, digits).split('.');
	const grouped = whole.replace('−', '').length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
	return decimals ? `${grouped}.${decimals}` : grouped;
}

/** The same with its sign always there: +3.2, −0.4. */
export const signedFigure = (value: number, digits: number): string =>
	Number(value.toFixed(digits)) > 0 ? `+${figure(value, digits)}` : figure(value, digits);

/** As many decimals as the value needs, at most `most`: 4.3 → "4.3", 25 → "25". */
export function shortFigure(value: number, most = 6): string {
	const decimals = Number(value.toFixed(most)).toString().split('.')[1]?.length ?? 0;
	return figure(value, decimals);
}
