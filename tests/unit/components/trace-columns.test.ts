import { describe, expect, it } from 'vitest';
import { plotFrame } from '$lib/components/bench/plot/plot-frame';
import { traceColumns } from '$lib/components/bench/plot/trace-columns';

const frame = plotFrame(
	{ width: 500, height: 200 },
	{ top: 0, right: 0, bottom: 0, left: 0 },
	{
		start: 0,
		stop: 1,
		topDbm: 0,
		bottomDbm: -100
	}
);
const heights = (line: Float32Array) => [...line].filter((_, i) => i % 2 === 1);

describe('traceColumns(levelsDbm, frame)', () => {
	it('draws every point where there is room', () => {
		const line = traceColumns([-10, -20, -30], frame);
		expect([...line]).toEqual([0, 20, 250, 40, 500, 60]);
	});

	it('keeps a line one point wide among ten thousand points', () => {
		const levels = new Float32Array(10_001).fill(-90);
		levels[4321] = -7;
		expect(Math.min(...heights(traceColumns(levels, frame)))).toBeCloseTo(14, 3);
	});

	it('keeps a notch one point wide too', () => {
		const levels = new Float32Array(10_001).fill(-20);
		levels[77] = -95;
		expect(Math.max(...heights(traceColumns(levels, frame)))).toBeCloseTo(190, 3);
	});

	it('leaves out what has not been swept yet', () =>
		expect(traceColumns([-10, NaN, NaN], frame).length).toBe(2));

	it('never draws below the axis', () =>
		expect(Math.max(...heights(traceColumns([-10, -500], frame)))).toBe(200));

	it('draws nothing of nothing', () => expect(traceColumns([], frame).length).toBe(0));
});
