/** The numbers worked out in the lesson "Phase noise and close-in spurs", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { filterLossDb, NOISE_PER_RBW } from '$lib/measure/resolution-filter';
import { field } from '$lib/server/bench/receiver/profiles';
import { phaseNoiseAt } from '$lib/server/bench/signal/phase-noise';
import { truth } from '$lib/server/bench/truth/truth';
import { dbToPowerRatio, powerRatioToDb } from '$lib/units/decibel';

const ownDbcPerHz = powerRatioToDb(phaseNoiseAt(field.phaseNoise!, 10e3));
const sumDb = (...levels: number[]) =>
	powerRatioToDb(levels.reduce((sum, level) => sum + dbToPowerRatio(level), 0));

describe('the lesson on phase noise and spurs', () => {
	it('−97 dBc/Hz in 8 kHz are −58 dBc', () => expect(-97 + powerRatioToDb(8000)).toBeCloseTo(-58, 0));

	it('a filter of 10 kHz is 12 dB down at 10 kHz', () => expect(filterLossDb(10e3, 10e3)).toBeCloseTo(12, 1));

	it('−71.6 dBc in 300 Hz are −96.6 dBc/Hz', () => {
		expect(powerRatioToDb(NOISE_PER_RBW * 300)).toBeCloseTo(25.0, 1);
		expect(-71.6 - powerRatioToDb(NOISE_PER_RBW * 300)).toBeCloseTo(-96.6, 1);
	});

	it('the field receiver’s own −97.2 dBc/Hz and −96.5 dBc/Hz make −93.8, 2.7 dB too high', () => {
		expect(ownDbcPerHz).toBeCloseTo(-97.2, 1);
		expect(sumDb(-96.5, ownDbcPerHz)).toBeCloseTo(-93.8, 1);
		expect(powerRatioToDb(10 ** -9.38 - 10 ** -9.72)).toBeCloseTo(-96.5, 1);
	});

	it('a sum 1 dB over one’s own leaves a difference 5.9 dB under it', () =>
		expect(powerRatioToDb(dbToPowerRatio(1) - 1)).toBeCloseTo(-5.9, 1));

	it('a skirt of −87.3 dBc/Hz lifts a line at −52 dBc by 2.9 dB in 3 kHz and by 0.1 dB in 100 Hz', () => {
		const skirtDbc = (rbwHz: number) => -87.3 + powerRatioToDb(NOISE_PER_RBW * rbwHz);
		expect(NOISE_PER_RBW * 3000).toBeCloseTo(3193, 0);
		expect(skirtDbc(3000)).toBeCloseTo(-52.3, 1);
		expect(sumDb(-52, skirtDbc(3000)) + 52).toBeCloseTo(2.9, 1);
		expect(skirtDbc(100)).toBeCloseTo(-67.0, 1);
		expect(sumDb(-52, skirtDbc(100)) + 52).toBeCloseTo(0.1, 1);
	});

	it('the figure’s oscillator has −87.3 dBc/Hz where its spur stands', () => {
		const skirt = [
			{ offsetHz: 100, dbcPerHz: -73 },
			{ offsetHz: 5000, dbcPerHz: -86 },
			{ offsetHz: 16000, dbcPerHz: -88 }
		];
		const line = { kind: 'cw' as const, frequencyHz: 1702e6, levelDbm: -8, phaseNoise: skirt };
		const asked = { kind: 'phase-noise' as const, carrierHz: 1702e6, offsetHz: 12e3 };
		expect(Math.abs(truth({ emitters: [line] }, asked).value + 87.3)).toBeLessThan(0.25);
	});

	it('a beacon of −68.0 dBm in −133.0 dBm/Hz stands 20.2 dB over the noise in 30 kHz', () => {
		const scene = {
			emitters: [
				{ kind: 'cw' as const, frequencyHz: 1.55e9, levelDbm: -68 },
				{ kind: 'noise' as const, densityDbmPerHz: -133, startHz: 1.54e9, stopHz: 1.56e9 }
			]
		};
		const asked = { kind: 'carrier-to-noise' as const, carrierHz: 1.55e9, widthHz: 30e3, noiseHz: 1.5501e9 };
		expect(truth(scene, asked).value).toBeCloseTo(20.2, 1);
	});

	it.each([
		[10, 0.4],
		[0, 3.0]
	])('a floor %d dB under the noise costs %d dB', (underDb, costsDb) =>
		expect(powerRatioToDb(1 + dbToPowerRatio(-underDb))).toBeCloseTo(costsDb, 1)
	);
});
