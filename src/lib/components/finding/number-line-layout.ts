/** The number line of a finding: what each mistake would have given, on one axis, with words above and below it. */
import type { FindingNumberLine } from '$lib/schemas/finding';
import { niceStep } from '../bench/plot/frequency-axis';
import { formatFigure } from '$lib/units/format-quantity';
import { spreadLabels } from './spread-labels';

type Mark = FindingNumberLine['marks'][number];

export interface PlacedMark extends Mark {
	/** px along the axis. */
	x: number;
	/** Middle of its words, px. */
	labelX: number;
	/** Row of its words: −1, −2 above the axis, 1, 2 below. */
	row: -2 | -1 | 1 | 2;
}

export interface NumberLineLayout {
	marks: PlacedMark[];
	ticks: { x: number; figure?: string }[];
	start: number;
	stop: number;
}

const characterPx = 6.4;
const sidePx = 14;
/** The learner's own, the true one and the mistake made are set bolder, and so wider. */
const labelPx = ({ label, role, matched }: Mark) =>
	label.length * (role === 'mistake' && !matched ? characterPx : characterPx * 1.1);

/**
 * Lays marks out over `width` px. The learner's number and the truth stand in the row next above the axis; mistakes
 * alternate below and above; words keep clear of their neighbours in a row.
 */
export function numberLineLayout(marks: readonly Mark[], width: number): NumberLineLayout {
	const values = marks.map((mark) => mark.value);
	const low = Math.min(...values);
	const high = Math.max(...values);
	// Marks that all but coincide still need an axis of some length.
	const margin = Math.max((high - low) * 0.08, Math.abs(high) * 1e-6, 1e-9);
	const start = low - margin;
	const stop = high + margin;
	const x = (value: number) => sidePx + ((value - start) / (stop - start)) * (width - 2 * sidePx);
	const rows = rowsOf(marks);
	const placed = marks.map((mark, i) => ({ ...mark, x: x(mark.value), labelX: 0, row: rows[i] }));
	for (const row of [-2, -1, 1, 2] as const) {
		const members = placed.filter((mark) => mark.row === row);
		const middles = spreadLabels(
			members.map((mark) => ({ at: mark.x, size: labelPx(mark) })),
			{ from: 0, to: width },
			10
		);
		members.forEach((mark, i) => (mark.labelX = middles[i]));
	}
	return { marks: placed, ticks: ticksOf(start, stop, x), start, stop };
}

/** Yours and true nearest above; the rest by turns, so that neighbours on the axis stand in different rows. */
function rowsOf(marks: readonly Mark[]): PlacedMark['row'][] {
	const turns = [1, -2, 2] as const;
	const others = marks
		.map((mark, i) => ({ mark, i }))
		.filter(({ mark }) => mark.role === 'mistake')
		.sort((a, b) => a.mark.value - b.mark.value);
	const rows: PlacedMark['row'][] = marks.map(() => -1);
	others.forEach(({ mark, i }, n) => (rows[i] = mark.matched ? 1 : turns[n % turns.length]));
	return rows;
}

function ticksOf(
	start: number,
	stop: number,
	x: (value: number) => number
): { x: number; figure?: string }[] {
	const { step, leading } = niceStep((stop - start) / 5);
	const minor = step / (leading === 2 ? 4 : 5);
	const decimals = Math.max(0, Math.ceil(-Math.log10(step) - 1e-9));
	const ticks = [];
	for (let n = Math.ceil(start / minor); n * minor <= stop; n++) {
		const value = n * minor;
		const long = Math.abs(value / step - Math.round(value / step)) < 1e-6;
		ticks.push(long ? { x: x(value), figure: formatFigure(value, decimals) } : { x: x(value) });
	}
	return ticks;
}
