import { describe, expect, it } from 'vitest';
import { bandGeometry } from '$lib/components/bench/plot/band-geometry';
import { plotFrame } from '$lib/components/bench/plot/plot-frame';

const frame = plotFrame(
	{ width: 1000, height: 400 },
	{ top: 0, right: 0, bottom: 30, left: 0 },
	{
		start: 0,
		stop: 1000,
		topDbm: 0,
		bottomDbm: -100
	}
);

describe('bandGeometry(band, frame)', () => {
	it('stands on its edges, the figure in the middle', () => {
		const band = bandGeometry({ start: 400, stop: 600 }, frame);
		expect(band).toMatchObject({ x0: 400, x1: 600, figureX: 500, startInside: true, stopInside: true });
	});

	it('is cut at the drawing’s edge, and says which edge is out of sight', () => {
		const band = bandGeometry({ start: -50, stop: 100 }, frame);
		expect(band).toMatchObject({ x0: 0, x1: 100, startInside: false, stopInside: true });
	});

	it('keeps the figure wholly inside', () =>
		expect(bandGeometry({ start: 980, stop: 1000 }, frame, 0, 120)?.figureX).toBe(940));

	it('stacks brackets so that their figures stand apart', () => {
		const [first, second] = [0, 1].map(
			(stack) => bandGeometry({ start: 1, stop: 2 }, frame, stack)!.dimensionY
		);
		expect(first - second).toBeGreaterThan(40);
	});

	it('is nothing when the band lies outside the window', () =>
		expect(bandGeometry({ start: 2000, stop: 3000 }, frame)).toBeUndefined());
});
