/** The numbers worked out in the lesson "Power of a spread signal", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { averageSpreadDb } from '$lib/measure/noise-statistics';
import { NOISE_PER_RBW, noiseBandwidthHz } from '$lib/measure/resolution-filter';
import type { Emitter } from '$lib/schemas/scene';
import type { Quantity } from '$lib/schemas/quantity';
import { LOG_AVERAGE_DB } from '$lib/server/bench/grading/noise-law';
import { truth } from '$lib/server/bench/truth/truth';
import { powerRatioToDb } from '$lib/units/decibel';
import { read, type Sweep } from '../bench-on-paper';

const carrierHz = 450.0125e6;
const carrier = (levelDbm: number): Emitter => ({
	kind: 'digital',
	frequencyHz: carrierHz,
	levelDbm,
	symbolRateHz: 10e3,
	rollOff: 0.25,
	order: 4
});
const LEAD_DB = 4.8;
const atCoupler = (quantity: Quantity): number => truth({ emitters: [carrier(-15)] }, quantity).value;
const atReceiver: Sweep = {
	emitters: [carrier(-15 - LEAD_DB)],
	settings: {
		centreHz: carrierHz,
		spanHz: 40e3,
		rbwHz: 300,
		points: 401,
		detector: 'average',
		scale: 'power',
		sweepTimeS: 20,
		traces: [{ mode: 'average', count: 16 }]
	},
	sweeps: 16
};
const channel = { kind: 'channel-power', centreHz: carrierHz, widthHz: 25e3 } as const;

describe('the lesson on the power of a spread signal', () => {
	it('a 300 Hz filter has a noise bandwidth of 319.3 Hz, 1.064 times its width', () => {
		expect(NOISE_PER_RBW).toBeCloseTo(1.064, 3);
		expect(noiseBandwidthHz(300)).toBeCloseTo(319.3, 1);
	});

	it('a marker misses 15.0 dB of 10 000 symbols a second, and shows −34.8 dBm', () => {
		expect(powerRatioToDb(10e3 / noiseBandwidthHz(300))).toBeCloseTo(15.0, 1);
		const middle = read(atReceiver, { kind: 'power-density', centreHz: carrierHz, widthHz: 4000 }).value;
		expect(Math.abs(middle + powerRatioToDb(noiseBandwidthHz(300)) + 34.8)).toBeLessThan(0.1);
	});

	it('channel power shows −19.8 dBm, and averaged in decibels −22.3 dBm', () => {
		expect(Math.abs(read(atReceiver, channel).value + 19.8)).toBeLessThan(0.1);
		const onDecibels = { ...atReceiver, settings: { ...atReceiver.settings, scale: 'log' as const } };
		expect(-19.8 - LOG_AVERAGE_DB).toBeCloseTo(-22.3, 1);
		expect(
			Math.abs(
				read({ ...onDecibels, settings: { ...onDecibels.settings, detector: 'sample' } }, channel).value +
					22.3
			)
		).toBeLessThan(0.5);
	});

	it('with the lead as Correction it shows −15.0 dBm, the truth at the coupler', () => {
		const corrected = { ...atReceiver, settings: { ...atReceiver.settings, correctionDb: LEAD_DB } };
		expect(Math.abs(read(corrected, channel).value + 15)).toBeLessThan(0.1);
		expect(atCoupler(channel)).toBeCloseTo(-15, 2);
	});

	it('a marker on 16 sweeps strays by 1.1 dB, the sum of some 500 values by 0.2 dB', () => {
		expect(averageSpreadDb('power', 16)).toBeCloseTo(1.1, 1);
		const filters = 10e3 / noiseBandwidthHz(300);
		expect(Math.round(filters)).toBe(31);
		expect(averageSpreadDb('power', 16 * filters)).toBeCloseTo(0.2, 1);
	});

	it('its middle holds −55.0 dBm in a hertz and −19.0 dBm in 4 kHz; 100 kHz are 50 dB more than one', () => {
		expect(atCoupler({ kind: 'power-density', centreHz: carrierHz, widthHz: 4000 })).toBeCloseTo(-55, 1);
		expect(atCoupler({ kind: 'channel-power', centreHz: carrierHz, widthHz: 4000 })).toBeCloseTo(-19, 1);
		expect(powerRatioToDb(100e3)).toBe(50);
	});
});
