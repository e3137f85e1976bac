/** The dimension between a marker and the one it is read from: extension lines down from both feet, a line between. */
export interface DeltaGeometry {
	/** Ends of the dimension line, px, left to right. */
	x0: number;
	x1: number;
	/** Where each extension line stands and which foot it comes from. */
	ends: { x: number; footY: number }[];
	dimensionY: number;
	figureX: number;
}

/** How far under the lower foot the line stands, and how far its words reach from it, px. */
const underPx = 30;
const wordsPx = 24;
/** Half the width that figure and words need. */
const halfWordsPx = 46;

/**
 * @param feet of the two markers, px; @param bounds the drawing
 * @param stack 0 for the first dimension; the next stands one row of words lower
 */
export function deltaGeometry(
	feet: readonly [{ x: number; y: number }, { x: number; y: number }],
	bounds: { leftPx: number; rightPx: number; topPx: number; bottomPx: number },
	stack = 0
): DeltaGeometry {
	const [left, right] = feet[0].x <= feet[1].x ? feet : [feet[1], feet[0]];
	const wanted = Math.max(left.y, right.y) + underPx + stack * 2 * wordsPx;
	const middle = (left.x + right.x) / 2;
	return {
		x0: left.x,
		x1: right.x,
		ends: [left, right].map(({ x, y }) => ({ x, footY: y })),
		dimensionY: Math.min(bounds.bottomPx - wordsPx, wanted),
		figureX: Math.min(bounds.rightPx - halfWordsPx, Math.max(bounds.leftPx + halfWordsPx, middle))
	};
}
