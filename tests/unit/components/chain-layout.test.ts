import { describe, expect, it } from 'vitest';
import { chainLayout, twoLines, type PlacedPart } from '$lib/components/bench/order/chain-layout';
import type { ChainPart } from '$lib/schemas/exercise';

const chain: ChainPart[] = [
	{ part: 'box', label: 'Transmitter' },
	{ part: 'box', label: 'Coupler', branch: 'to the antenna' },
	{ part: 'plane', label: 'answer for this plane' },
	{ part: 'lead', label: '3.2 dB lead' },
	{ part: 'box', label: 'Receiver' }
];
const right = (part: PlacedPart) => (part.part === 'plane' ? part.x : part.x + part.width);

describe('chainLayout(chain, width)', () => {
	it.each([336, 280, 358])('fills %i px and leaves none of its parts outside', (width) => {
		const { parts } = chainLayout(chain, width);
		expect(Math.max(...parts.map(right))).toBeCloseTo(width, 6);
		expect(Math.min(...parts.map((part) => part.x))).toBe(0);
	});

	it('draws the reference plane on the wire between its neighbours', () => {
		const { parts } = chainLayout(chain, 336);
		const [, coupler, plane, lead] = parts;
		expect(plane.x).toBeGreaterThan(right(coupler));
		expect(plane.x).toBeLessThan(lead.x);
	});

	it('joins all parts in one line', () => {
		const { wires, parts } = chainLayout(chain, 336);
		const solid = parts.filter((part) => part.part !== 'plane');
		expect(wires).toHaveLength(solid.length - 1);
		wires.forEach(({ x0, x1 }, i) => {
			expect(x0).toBeCloseTo(right(solid[i]), 6);
			expect(x1).toBeCloseTo(solid[i + 1].x, 6);
		});
	});

	it('breaks long labels over two lines only where they don’t fit', () => {
		const lines = (width: number) =>
			chainLayout(
				[
					{ part: 'box', label: 'Harbour base station' },
					{ part: 'lead', label: 'lead' },
					{ part: 'box', label: 'Field receiver' }
				],
				width
			).parts.map((part) => (part.part === 'plane' ? 0 : part.lines.length));
		expect(lines(400)).toEqual([1, 1, 1]);
		expect(lines(230)).toEqual([2, 1, 2]);
	});
});

describe('twoLines(label)', () => {
	it('breaks at the space nearest the middle', () =>
		expect(twoLines('to the old antenna')).toEqual(['to the old', 'antenna']));
	it('leaves one word whole', () => expect(twoLines('Transmitter')).toEqual(['Transmitter']));
});

describe('the words of a branch', () => {
	const branchAt = (parts: ChainPart[]) => {
		const box = chainLayout(parts, 336).parts.find((part) => part.part === 'box' && part.branch);
		return box?.part === 'box' ? box.branch?.end : undefined;
	};

	it('stand before the box, but after it where the reference plane stands before it', () => {
		const [transmitter, coupler, plane, ...rest] = chain;
		expect(branchAt(chain)).toBe('end');
		expect(branchAt([transmitter, plane, coupler, ...rest])).toBe('start');
	});
});
