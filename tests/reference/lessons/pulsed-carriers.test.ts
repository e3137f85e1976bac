/** The numbers worked out in the lesson "Pulsed carriers", from the product's own functions. */
import { describe, expect, it } from 'vitest';
import { pulseLossDb, shownWidthS } from '$lib/server/bench/grading/pulses';
import { truth } from '$lib/server/bench/truth/truth';

const radar = {
	kind: 'pulsed' as const,
	frequencyHz: 2.85e9,
	levelDbm: -30,
	widthS: 1.5e-6,
	periodS: 1 / 600
};
const altimeter = {
	kind: 'pulsed' as const,
	frequencyHz: 4.3e9,
	levelDbm: -14,
	widthS: 0.8e-6,
	periodS: 20e-6
};

describe('the lesson on pulsed carriers', () => {
	it('through 100 kHz a pulse of 1.5 µs loses 12.9 dB', () => {
		expect(-20 * Math.log10(1.505 * 0.15)).toBeCloseTo(12.9, 1);
		expect(Math.abs(pulseLossDb(radar, 100e3) - 12.9)).toBeLessThan(0.15);
	});

	it.each([
		[1e6, 0.04],
		[3e6, 0]
	])('through %d Hz it loses %d dB', (rbwHz, db) => expect(pulseLossDb(radar, rbwHz)).toBeCloseTo(db, 1));

	it('its middle line stands 60.9 dB under the pulse, its mean power 30.5 dB', () => {
		const line = truth({ emitters: [radar] }, { kind: 'marker', atHz: 2.85e9 }).value;
		expect(line - radar.levelDbm).toBeCloseTo(-60.9, 1);
		expect(10 * Math.log10(0.0009)).toBeCloseTo(-30.5, 1);
		expect(pulseLossDb(radar, 300)).toBeCloseTo(60.9, 1);
	});

	it('a Gaussian filter rings 0.62/B over half: 0.21 ms at 3 kHz', () => {
		const shown = shownWidthS(1e-6, { rbwHz: 3000, vbwHz: 3e6 });
		expect(0.62 / 3000).toBeCloseTo(0.21e-3, 5);
		// the reading takes half of the typical high level, which lies a little under the crest
		expect(Math.abs(shown * 3000 - 0.62)).toBeLessThan(0.12);
	});

	it('the altimeter: 0.80 µs from nulls 2.50 MHz apart, a middle line at −42.0 dBm, spikes 160 kHz apart', () => {
		const line = truth({ emitters: [altimeter] }, { kind: 'marker', atHz: 4.3e9 }).value;
		expect(line).toBeCloseTo(-42.0, 1);
		expect(2 / 2.5e6).toBeCloseTo(0.8e-6, 9);
		expect(-20 * Math.log10(0.8e-6 * 50_000)).toBeCloseTo(28.0, 1);
		expect(8e6 / 1e-3 / 50_000).toBe(160e3);
		expect(truth({ emitters: [altimeter] }, { kind: 'pulse-level', carrierHz: 4.3e9 }).value).toBe(-14);
	});
});
