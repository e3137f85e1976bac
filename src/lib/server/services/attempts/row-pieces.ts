import type { ResolvedSettings } from '$lib/schemas/settings';
import type { RowClock } from './row-clock';

/** A stretch of a row that bench time has just passed over. */
export interface RowPiece {
	row: number;
	fromPoint: number;
	/** One more than its last point. */
	toPoint: number;
	/** Bench clock when its last point has been swept, s. */
	clockS: number;
}

/**
 * What the receiver sweeps over while the bench clock goes from `fromS` (excluded) to `toS` (included), in order.
 * Point i of a row is there (i + 1)·T/(points − 1) after its start; T the sweep time. Neighbouring calls leave no gap.
 * @param row a row that begins at or before `fromS`, or the first of the set-up
 * @param pieceS longest bench time a piece covers, s
 */
export function* rowPieces(
	span: { fromS: number; toS: number; row: number },
	rows: RowClock,
	{ points, sweepTimeS }: Pick<ResolvedSettings, 'points' | 'sweepTimeS'>,
	pieceS: number
): Generator<RowPiece> {
	const pointS = sweepTimeS / (points - 1);
	for (let row = span.row; rows.startS(row) < span.toS; row++) {
		const startS = rows.startS(row);
		// A billionth of a point: a piece that ends on a point's very end holds it, whatever the rounding.
		const pointsBy = (clockS: number) =>
			Math.max(0, Math.min(points, Math.floor((clockS - startS) / pointS + 1e-9)));
		let fromPoint = pointsBy(span.fromS);
		const lastPoint = pointsBy(span.toS);
		const step = Math.max(1, Math.floor(pieceS / pointS));
		while (fromPoint < lastPoint) {
			const toPoint = Math.min(lastPoint, fromPoint + step);
			yield { row, fromPoint, toPoint, clockS: startS + toPoint * pointS };
			fromPoint = toPoint;
		}
	}
}
