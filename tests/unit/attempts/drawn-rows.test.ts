import { describe, expect, it } from 'vitest';
import type { SetUp } from '$lib/server/db/models/set-up';
import { countRows, drawnRows, lastRows } from '$lib/server/services/attempts/drawn-rows';

const setUp = (firstRow: number, drawnTo: number | null) => ({ firstRow, drawnTo }) as SetUp;
const log = [setUp(0, 9), setUp(12, null), setUp(12, 30)];
const ranges = (stretches: ReturnType<typeof drawnRows>) =>
	stretches.map(({ fromRow, toRow }) => [fromRow, toRow]);

describe('drawnRows(log, fromRow, toRow)', () => {
	it('leaves out what was swept ahead and never drawn', () =>
		expect(ranges(drawnRows(log, 3, 20))).toEqual([
			[3, 9],
			[12, 20]
		]));

	it('is empty where nothing was drawn', () => expect(drawnRows(log, 10, 11)).toEqual([]));
});

describe('lastRows(stretches, count)', () => {
	it('counts back over set-ups, past the gap between them', () =>
		expect(ranges(lastRows(drawnRows(log, 0, 20), 11))).toEqual([
			[8, 9],
			[12, 20]
		]));

	it('gives all there are when fewer', () =>
		expect(countRows(lastRows(drawnRows(log, 0, 20), 100))).toBe(19));
});
