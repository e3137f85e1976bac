import type { SetUp } from '$lib/server/db/models/set-up';

/** A stretch of rows that one set-up swept and the page drew. */
export interface DrawnRows {
	setUp: SetUp;
	fromRow: number;
	toRow: number;
}

/** The drawn rows between `fromRow` and `toRow`, both included, set-up by set-up. Rows nobody drew are left out. */
export function drawnRows(log: SetUp[], fromRow: number, toRow: number): DrawnRows[] {
	return log.flatMap((setUp) => {
		if (setUp.drawnTo === null) return [];
		const from = Math.max(fromRow, setUp.firstRow);
		const to = Math.min(toRow, setUp.drawnTo);
		return from <= to ? [{ setUp, fromRow: from, toRow: to }] : [];
	});
}

export const countRows = (stretches: DrawnRows[]): number =>
	stretches.reduce((sum, { fromRow, toRow }) => sum + toRow - fromRow + 1, 0);

/** The last `count` of these rows. */
export function lastRows(stretches: DrawnRows[], count: number): DrawnRows[] {
	let wanted = count;
	const kept: DrawnRows[] = [];
	for (const stretch of stretches.toReversed()) {
		if (wanted <= 0) break;
		const fromRow = Math.max(stretch.fromRow, stretch.toRow - wanted + 1);
		wanted -= stretch.toRow - fromRow + 1;
		kept.unshift({ ...stretch, fromRow });
	}
	return kept;
}
