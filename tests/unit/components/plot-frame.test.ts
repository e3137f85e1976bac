import { describe, expect, it } from 'vitest';
import { levelAt, plotFrame } from '$lib/components/bench/plot/plot-frame';

const margins = { top: 10, right: 20, bottom: 30, left: 40 };
const frame = plotFrame({ width: 1060, height: 340 }, margins, {
	start: 449.975e6,
	stop: 450.075e6,
	topDbm: 0,
	bottomDbm: -100
});

describe('plotFrame(size, margins, window)', () => {
	it('puts the window’s corners on the drawing’s corners', () => {
		expect([frame.x(449.975e6), frame.x(450.075e6)]).toEqual([40, 1040]);
		expect([frame.y(0), frame.y(-100)]).toEqual([10, 310]);
	});

	it('gives back the place a pixel came from', () =>
		expect(frame.at(frame.x(450.0123e6))).toBeCloseTo(450.0123e6, 3));

	it('holds a place beyond an edge at that edge', () => {
		expect(frame.at(-500)).toBe(449.975e6);
		expect(frame.at(5000)).toBe(450.075e6);
	});

	it('puts a window without width in the middle', () => {
		const still = plotFrame({ width: 1060, height: 340 }, margins, {
			start: 1,
			stop: 1,
			topDbm: 0,
			bottomDbm: -100
		});
		expect(still.x(1)).toBe(540);
	});

	it('never turns over when there is no room', () => {
		const tiny = plotFrame({ width: 10, height: 10 }, margins, {
			start: 0,
			stop: 1,
			topDbm: 0,
			bottomDbm: -100
		});
		expect(tiny.rightPx).toBeGreaterThan(tiny.leftPx);
		expect(tiny.bottomPx).toBeGreaterThan(tiny.topPx);
	});
});

describe('levelAt(levelsDbm, window, at)', () => {
	const window = { start: 100e6, stop: 101e6 };
	it('is the level of the nearest point', () => {
		expect(levelAt([-10, -20, -30], window, 100.5e6)).toBe(-20);
		expect(levelAt([-10, -20, -30], window, 100.8e6)).toBe(-30);
	});
	it('is none outside the window, of nothing, and where nothing was swept yet', () => {
		expect(levelAt([-10, -20, -30], window, 102e6)).toBeUndefined();
		expect(levelAt([], window, 100.5e6)).toBeUndefined();
		expect(levelAt([-10, NaN, -30], window, 100.5e6)).toBeUndefined();
	});
});
