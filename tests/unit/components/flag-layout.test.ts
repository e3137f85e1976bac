import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { flagPx, placeFlags, type FlagPlace } from '$lib/components/bench/plot/flag-layout';

const bounds = { leftPx: 40, rightPx: 1000, topPx: 10 };
const box = ({ x, y, stem, side }: FlagPlace) => {
	const left = side === 'right' ? x : x - flagPx.width;
	return { left, right: left + flagPx.width, top: y - stem, bottom: y - stem + flagPx.height };
};
const overlap = (a: FlagPlace, b: FlagPlace) => {
	const [p, q] = [box(a), box(b)];
	return p.left < q.right && q.left < p.right && p.top < q.bottom && q.top < p.bottom;
};

describe('placeFlags(feet, bounds)', () => {
	it('gives a lone marker the short stem', () =>
		expect(placeFlags([{ x: 300, y: 200 }], bounds)[0].stem).toBe(flagPx.leastStem));

	it('turns two neighbours away from each other', () => {
		const [a, b] = placeFlags(
			[
				{ x: 300, y: 200 },
				{ x: 316, y: 200 }
			],
			bounds
		);
		expect([a.side, b.side]).toEqual(['left', 'right']);
	});

	it('keeps the cloth inside the drawing at both edges', () => {
		const [left, right] = placeFlags(
			[
				{ x: 41, y: 200 },
				{ x: 999, y: 200 }
			],
			bounds
		);
		expect([left.side, right.side]).toEqual(['right', 'left']);
	});

	it('never lets two of three markers on one level overlap, however close they stand', () =>
		fc.assert(
			fc.property(fc.array(fc.integer({ min: 60, max: 980 }), { minLength: 2, maxLength: 3 }), (xs) => {
				const places = placeFlags(
					xs.map((x) => ({ x, y: 200 })),
					bounds
				);
				for (const [i, a] of places.entries()) {
					for (const b of places.slice(i + 1)) expect(overlap(a, b)).toBe(false);
				}
			})
		));

	it('shortens the stem of a marker close under the top', () => {
		const [place] = placeFlags([{ x: 300, y: 30 }], bounds);
		expect(30 - place.stem).toBeGreaterThanOrEqual(bounds.topPx);
	});
});
