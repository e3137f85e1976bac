import { describe, expect, it } from 'vitest';
import { stackRow } from '$lib/components/bench/over-time/stack-row';

const window = { topDbm: 0, bottomDbm: -100 };

describe('stackRow(levelsDbm, widthPx, window)', () => {
	it('gives ink by level: none at the foot, all of it at the top, half half-way', () => {
		expect([...stackRow([-100, -50, 0], 3, window)]).toEqual([0, 127, 255]);
	});

	it('stays within no ink and all of it beyond the window', () => {
		expect([...stackRow([-140, 20], 2, window)]).toEqual([0, 255]);
	});

	it('keeps a line one point wide however many points share a pixel', () => {
		const levels = new Float32Array(10_001).fill(-100);
		levels[4321] = 0;
		const ink = stackRow(levels, 300, window);
		expect(ink.filter((level) => level === 255)).toHaveLength(1);
		expect(ink.indexOf(255)).toBe(Math.round((4321 / 10_000) * 299));
	});

	it('repeats points where there are fewer than pixels', () => {
		expect([...stackRow([-100, 0], 6, window)]).toEqual([0, 0, 0, 255, 255, 255]);
	});

	it('leaves blank what was not swept', () => {
		expect([...stackRow([NaN, NaN, 0], 3, window)]).toEqual([0, 0, 255]);
		expect([...stackRow([], 2, window)]).toEqual([0, 0]);
	});
});
