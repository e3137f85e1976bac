import { describe, expect, it } from 'vitest';
import { bandStacks } from '$lib/components/bench/plot/band-stacks';
import { plotFrame } from '$lib/components/bench/plot/plot-frame';

const frame = plotFrame(
	{ width: 1000, height: 400 },
	{ top: 0, right: 0, bottom: 30, left: 0 },
	{ start: 0, stop: 1000, topDbm: 0, bottomDbm: -100 }
);
const band = (start: number, stop: number) => ({ start, stop });

describe('bandStacks(bands, frame)', () => {
	it('leaves brackets that stand apart on one row', () =>
		expect(bandStacks([band(400, 600), band(100, 300), band(700, 900)], frame)).toEqual([0, 0, 0]));

	it('puts a bracket above what it would meet, and no higher', () =>
		expect(bandStacks([band(100, 500), band(400, 600), band(700, 900), band(450, 550)], frame)).toEqual([
			0, 1, 0, 2
		]));

	it('keeps two figures apart, though narrow bands leave room between them', () =>
		expect(bandStacks([band(400, 410), band(450, 460)], frame, 120)).toEqual([0, 1]));

	it('gives no row to a band out of sight', () =>
		expect(bandStacks([band(2000, 3000), band(400, 600)], frame)).toEqual([0, 0]));
});
