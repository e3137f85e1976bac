import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { cascadeNoiseFactor, floorDensity, lossStage } from '$lib/server/bench/receiver/front-end/floor';
import { field } from '$lib/server/bench/receiver/profiles';

const db = (ratio: number) => 10 * Math.log10(ratio);
const frequencyHz = fc.double({ min: 0, max: 9e9, noNaN: true });

describe('cascadeNoiseFactor(stages)', () => {
	it('of one stage is its own', () => expect(cascadeNoiseFactor([{ gain: 5, noiseFactor: 3 }])).toBe(3));
	it('of losses is their product', () =>
		expect(db(cascadeNoiseFactor([lossStage(3), lossStage(7), lossStage(0.5)]))).toBeCloseTo(10.5, 12));
});

describe('floorDensity(profile, settings)', () => {
	it('rises by exactly as many dB as the attenuator takes, preamplifier off or on', () =>
		fc.assert(
			fc.property(frequencyHz, fc.constantFrom(5, 10, 25, 50), fc.boolean(), (f, attenuationDb, preamp) => {
				const without = floorDensity(field, { attenuationDb: 0, preamp })(f);
				const withIt = floorDensity(field, { attenuationDb, preamp })(f);
				expect(db(withIt / without)).toBeCloseTo(attenuationDb, 9);
			})
		));
	it('never lies under k·T₀, and the preamplifier always lowers it', () =>
		fc.assert(
			fc.property(frequencyHz, (f) => {
				const off = floorDensity(field, { attenuationDb: 0, preamp: false })(f);
				const on = floorDensity(field, { attenuationDb: 0, preamp: true })(f);
				expect(on).toBeLessThan(off);
				expect(on).toBeGreaterThan(4.0038821e-18);
			})
		));
	it('is flat outside the noise figure table', () => {
		const floor = floorDensity(
			{ ...field, noiseFigureDb: [{ frequencyHz: 1e9, db: 24 }] },
			{ attenuationDb: 0, preamp: false }
		);
		expect(floor(1)).toBe(floor(8e9));
	});
});
