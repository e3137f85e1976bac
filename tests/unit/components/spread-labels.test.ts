import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadLabels } from '$lib/components/finding/spread-labels';

const bounds = { from: 0, to: 500 };
const label = fc.record({ at: fc.integer({ min: -50, max: 550 }), size: fc.integer({ min: 5, max: 60 }) });

describe('spreadLabels(labels, bounds, gapPx)', () => {
	it('leaves labels alone that have room', () =>
		expect(
			spreadLabels(
				[
					{ at: 100, size: 20 },
					{ at: 200, size: 20 }
				],
				bounds,
				4
			)
		).toEqual([100, 200]));

	it('moves two that would overlap apart by the same way', () =>
		expect(
			spreadLabels(
				[
					{ at: 100, size: 20 },
					{ at: 100, size: 20 }
				],
				bounds,
				4
			)
		).toEqual([88, 112]));

	it('holds labels inside the bounds', () =>
		expect(spreadLabels([{ at: 2, size: 20 }], bounds, 4)).toEqual([10]));

	it('never lets labels overlap, as long as there is room for all', () =>
		fc.assert(
			fc.property(fc.array(label, { maxLength: 6 }), (labels) => {
				const middles = spreadLabels(labels, bounds, 4);
				const order = labels.map((_, i) => i).sort((a, b) => middles[a] - middles[b]);
				for (let n = 1; n < order.length; n++) {
					const [a, b] = [order[n - 1], order[n]];
					expect(middles[b] - middles[a]).toBeGreaterThanOrEqual(
						(labels[a].size + labels[b].size) / 2 + 4 - 1e-6
					);
				}
			})
		));
});
