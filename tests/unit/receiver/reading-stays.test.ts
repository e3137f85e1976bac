import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Emitter } from '$lib/schemas/scene';
import { ideal, read } from '../../reference/bench-on-paper';

const receiver = { ...ideal, noiseFigureDb: [{ frequencyHz: 1e9, db: 20 }] };
const emitters: Emitter[] = [
	{ kind: 'digital', frequencyHz: 1e9, levelDbm: -30, symbolRateHz: 1e6, rollOff: 0.22, order: 4 }
];
const setUp = fc.record({
	spanHz: fc.constantFrom(3e6, 4e6, 6e6),
	points: fc.constantFrom(801, 1001, 2001),
	referenceDbm: fc.constantFrom(-20, -10, 0),
	attenuationDb: fc.constantFrom(0, 10, 20)
});

describe('a reading without remarks', () => {
	it('stays within its spread when span, points, reference level or attenuation change', () => {
		let judged = 0;
		fc.assert(
			fc.property(setUp, fc.nat(1e6), (settings, seed) => {
				const reading = read(
					{
						receiver,
						emitters,
						settings: {
							centreHz: 1e9,
							rbwHz: 30e3,
							detector: 'average',
							scale: 'power',
							traces: [{ mode: 'average', count: 20 }],
							...settings
						},
						seed,
						sweeps: 20
					},
					{ kind: 'channel-power', centreHz: 1e9, widthHz: 1.5e6 }
				);
				if (reading.remarks.length > 0) return;
				judged++;
				// five standard deviations, and the 0.1 dB of bias that channel power may have
				expect(Math.abs(reading.value + 30)).toBeLessThan(5 * reading.spread + 0.1);
			}),
			{ numRuns: 60, seed: 21 }
		);
		expect(judged).toBeGreaterThan(30);
	});
});
