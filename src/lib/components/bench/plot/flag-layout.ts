/** Where the flags of markers stand: each turns away from its neighbour and rises until none overlap. */
import type { PlotFrame } from './plot-frame';

export const flagPx = { width: 19, height: 15, leastStem: 24, mostStem: 46 };

export interface FlagPlace {
	/** The foot on the trace, px. */
	x: number;
	y: number;
	/** px from the foot up to the flag's top edge. */
	stem: number;
	/** Which way the cloth flies. */
	side: 'left' | 'right';
}

/** Where a marker's foot stands on its trace, px: inside the drawing, with room for the flag above it. */
export const footOf = (frame: PlotFrame, at: number, levelDbm: number): { x: number; y: number } => ({
	x: frame.x(at),
	y: Math.max(frame.topPx + 18, Math.min(frame.bottomPx, frame.y(levelDbm)))
});

interface Box {
	left: number;
	right: number;
	top: number;
	bottom: number;
}

const gapPx = 2;

function boxOf({ x, y, stem, side }: FlagPlace): Box {
	const left = side === 'right' ? x : x - flagPx.width;
	return { left, right: left + flagPx.width, top: y - stem, bottom: y - stem + flagPx.height };
}

const overlap = (a: Box, b: Box) =>
	a.left < b.right + gapPx &&
	b.left < a.right + gapPx &&
	a.top < b.bottom + gapPx &&
	b.top < a.bottom + gapPx;

/**
 * Places one flag for each foot, in the order given: later ones give way to earlier ones.
 * @param feet px; @param bounds the drawing, so that no cloth leaves it
 * @returns in the order of `feet`. When nothing within the greatest stem is free, the flag stands at the greatest stem.
 */
export function placeFlags(
	feet: readonly { x: number; y: number }[],
	bounds: { leftPx: number; rightPx: number; topPx: number }
): FlagPlace[] {
	const placed: FlagPlace[] = [];
	for (const foot of feet) {
		const neighbour = nearestOther(foot, feet);
		const away = neighbour && neighbour.x > foot.x ? 'left' : 'right';
		const sides = [away, away === 'left' ? 'right' : 'left'] as const;
		placed.push(freePlace(foot, sides, placed, bounds));
	}
	return placed;
}

function nearestOther(foot: { x: number; y: number }, feet: readonly { x: number; y: number }[]) {
	let nearest: { x: number; y: number } | undefined;
	for (const other of feet) {
		if (other === foot || Math.abs(other.x - foot.x) > 2 * flagPx.width + 6) continue;
		if (!nearest || Math.abs(other.x - foot.x) < Math.abs(nearest.x - foot.x)) nearest = other;
	}
	return nearest;
}

function freePlace(
	foot: { x: number; y: number },
	sides: readonly ('left' | 'right')[],
	placed: FlagPlace[],
	bounds: { leftPx: number; rightPx: number; topPx: number }
): FlagPlace {
	const inside = (box: Box) => box.left >= bounds.leftPx && box.right <= bounds.rightPx;
	const tallest = Math.max(flagPx.height + 3, Math.min(flagPx.mostStem, foot.y - bounds.topPx));
	const lowest = Math.min(flagPx.leastStem, tallest);
	for (let stem = lowest; stem <= tallest; stem += 2) {
		for (const side of sides) {
			const place: FlagPlace = { ...foot, stem, side };
			const box = boxOf(place);
			if (inside(box) && !placed.some((other) => overlap(box, boxOf(other)))) return place;
		}
	}
	const side = sides.find((s) => inside(boxOf({ ...foot, stem: tallest, side: s }))) ?? sides[0];
	return { ...foot, stem: tallest, side };
}
