/** Where the note of a marker stands: a shoulder from its flag outwards, away from the stem, inside the drawing. */
import { flagPx, type FlagPlace } from './flag-layout';

/** Width of a character of the figure and of what stands beneath, px. */
const figurePx = 9;
const wherePx = 7.3;
const gapPx = 3;

export interface NotePlace {
	/** Height of the shoulder, px, and its ends. */
	y: number;
	fromX: number;
	toX: number;
	/** Where the text is set, on which side. */
	textX: number;
	anchor: 'start' | 'end';
}

/** @param figure what stands on the shoulder; @param where what stands under it */
export function notePlace(
	{ x, y, stem, side }: FlagPlace,
	bounds: { leftPx: number; rightPx: number },
	figure: string,
	where: string
): NotePlace {
	const width = Math.max(figure.length * figurePx, where.length * wherePx);
	const cloth = flagPx.width + gapPx;
	const right = x + (side === 'right' ? cloth : gapPx);
	const left = x - (side === 'left' ? cloth : gapPx);
	const fitsRight = right + width <= bounds.rightPx;
	const fitsLeft = left - width >= bounds.leftPx;
	const toRight = side === 'right' ? fitsRight || !fitsLeft : fitsRight && !fitsLeft;
	const shoulder = y - stem + flagPx.height - 1;
	return toRight
		? { y: shoulder, fromX: right, toX: right + width, textX: right + gapPx, anchor: 'start' }
		: { y: shoulder, fromX: left, toX: left - width, textX: left - gapPx, anchor: 'end' };
}
