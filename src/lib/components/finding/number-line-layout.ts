/** The number line of a finding: what each mistake would have given, on one axis, with words above and below it. */
import type { FindingNumberLine } from '$lib/schemas/questions/finding';
import { niceStep } from '../bench/plot/frequency-axis';
import { formatFigure } from '$lib/units/format-quantity';
import { spreadLabels } from './spread-labels';

type Mark = FindingNumberLine['marks'][number];

export interface PlacedMark extends Mark {
	/** px along the axis. */
	x: number;
	/** Middle of its words, px. */
	labelX: number;
	/** Row of its words: −1, −2 … above the axis, 1, 2 … below. */
	row: number;
}

export interface NumberLineLayout {
	marks: PlacedMark[];
	/** How many rows of words there are above and below the axis. */
	above: number;
	below: number;
	ticks: { x: number; figure?: string }[];
	start: number;
	stop: number;
}

const characterPx = 6.4;
const sidePx = 14;
/** The learner's own, the true one and the mistake made are set bolder, and so wider. */
const labelPx = ({ label, role, matched }: Mark) =>
	label.length * (role === 'mistake' && !matched ? characterPx : characterPx * 1.1);

const gapPx = 10;
/** Rows that a mistake's words may stand in, the nearest first: below, then above the row of yours and true. */
const rowsFor = [1, -2, 2, -3, 3, -4, 4, -5, 5] as const;

/**
 * Lays marks out over `width` px. The learner's number and the truth stand in the row next above the axis; a mistake's words
 * in the nearest row where they have room under (or over) their own mark; words keep clear of their neighbours in a row.
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
	const rows = rowsOf(marks, x, width);
	const placed = marks.map((mark, i) => ({ ...mark, x: x(mark.value), labelX: 0, row: rows[i] }));
	for (const row of new Set(rows)) {
		const members = placed.filter((mark) => mark.row === row);
		const middles = spreadLabels(
			members.map((mark) => ({ at: mark.x, size: labelPx(mark) })),
			{ from: 0, to: width },
			gapPx
		);
		members.forEach((mark, i) => (mark.labelX = middles[i]));
	}
	const above = Math.max(1, -Math.min(...rows));
	const below = Math.max(1, ...rows);
	return { marks: placed, above, below, ticks: ticksOf(start, stop, x), start, stop };
}

/** Yours and true nearest above; each of the rest where it has room, else in the row that is emptiest. */
function rowsOf(marks: readonly Mark[], x: (value: number) => number, width: number): number[] {
	const taken = new Map<number, { from: number; to: number }[]>();
	const others = marks
		.map((mark, i) => ({ mark, i }))
		.filter(({ mark }) => mark.role === 'mistake')
		.sort((a, b) => Number(b.mark.matched) - Number(a.mark.matched) || a.mark.value - b.mark.value);
	const rows: number[] = marks.map(() => -1);
	for (const { mark, i } of others) {
		const half = labelPx(mark) / 2;
		const middle = Math.min(width - half, Math.max(half, x(mark.value)));
		const place = { from: middle - half - gapPx, to: middle + half + gapPx };
		const free = rowsFor.find((row) =>
			(taken.get(row) ?? []).every(({ from, to }) => to <= place.from + gapPx || from + gapPx >= place.to)
		);
		const emptiest = () =>
			[...rowsFor].sort((a, b) => (taken.get(a)?.length ?? 0) - (taken.get(b)?.length ?? 0))[0];
		rows[i] = free ?? emptiest();
		taken.set(rows[i], [...(taken.get(rows[i]) ?? []), place]);
	}
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
