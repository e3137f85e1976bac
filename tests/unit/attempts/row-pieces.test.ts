import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { RowClock } from '$lib/server/services/attempts/row-clock';
import { rowPieces, type RowPiece } from '$lib/server/services/attempts/row-pieces';
import { speedUpOf } from '$lib/server/services/attempts/speed-up';

describe('rowPieces(span, rows, settings, pieceS)', () => {
	it('gives a short row whole when its last point has been swept, before the retrace', () => {
		const rows = new RowClock(() => 0.03, 0, 0);
		const pieces = [
			...rowPieces({ fromS: 0, toS: 0.06, row: 0 }, rows, { points: 101, sweepTimeS: 0.01 }, 0.05)
		];
		expect(pieces.map(({ row, fromPoint, toPoint }) => [row, fromPoint, toPoint])).toEqual([
			[0, 0, 101],
			[1, 0, 101]
		]);
		expect(pieces[0].clockS).toBeCloseTo(0.01 * 1.01, 12);
		expect(pieces[1].clockS).toBeCloseTo(0.03 + 0.01 * 1.01, 12);
	});

	it('covers every point of every row once, in order, however bench time is sliced', () => {
		const slices = fc.array(fc.double({ min: 0.001, max: 0.7, noNaN: true }), {
			minLength: 5,
			maxLength: 60
		});
		const settings = fc.record({
			points: fc.integer({ min: 101, max: 2001 }),
			sweepTimeS: fc.double({ min: 0.001, max: 5, noNaN: true })
		});
		fc.assert(
			fc.property(slices, settings, fc.double({ min: 0.01, max: 0.2, noNaN: true }), (each, set, pieceS) => {
				const sweptS = (set.sweepTimeS * set.points) / (set.points - 1);
				const rows = new RowClock(() => sweptS + 0.015, 7, 3.25);
				const got: RowPiece[] = [];
				let fromS = 3.25;
				let row = 7;
				for (const sliceS of each) {
					const toS = fromS + sliceS;
					got.push(...rowPieces({ fromS, toS, row }, rows, set, pieceS));
					fromS = toS;
					while (rows.endS(row) <= fromS) row++;
				}
				let expected = { row: 7, point: 0 };
				for (const piece of got) {
					expect([piece.row, piece.fromPoint]).toEqual([expected.row, expected.point]);
					const whole = piece.toPoint === set.points;
					expected = whole ? { row: piece.row + 1, point: 0 } : { row: piece.row, point: piece.toPoint };
				}
				expect(got.every((piece, i) => i === 0 || piece.clockS >= got[i - 1].clockS)).toBe(true);
				const done = rows.startS(expected.row) + ((expected.point + 1) * set.sweepTimeS) / (set.points - 1);
				expect(done).toBeGreaterThan(fromS - 1e-6);
			})
		);
	});
});

describe('speedUpOf(sweepTimeS)', () => {
	it('leaves sweeps that can be waited for at real time', () =>
		expect([0.001, 2.78, 8].map(speedUpOf)).toEqual([1, 1, 1]));

	it('is the next round factor that keeps a sweep under 8 s', () =>
		expect([8.1, 40, 41, 570, 2000].map(speedUpOf)).toEqual([2, 5, 10, 100, 500]));
});
