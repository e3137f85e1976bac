/** The numbers worked out in the lessons of units 1 to 3 are the product's own: each is computed here and looked for in the text. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { figure } from '$lib/server/bench/exercise/figure';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { filterLossDb, filterWidthHz, noiseBandwidthHz, sweepLossDb } from '$lib/measure/resolution-filter';
import { floorDensity } from '$lib/server/bench/receiver/front-end/floor';
import { countFrequency } from '$lib/server/bench/receiver/count';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { powerRatioToDb } from '$lib/units/decibel';
import { dbmToWatts, wattsToDbm } from '$lib/units/level';

const lesson = (folder: string): string =>
	readFileSync(`content/spectrum-measurement/${folder}/lesson.md`, 'utf8').replace(/\s+/g, ' ');

describe('Connect safely', () => {
	const text = lesson('01-connect-safely');
	const carrierDbm = wattsToDbm(500);
	const lost = 22.2 + 4.4;

	it('takes a 500 W transmitter to the connector and back', () => {
		expect(text).toContain(`500 W is ${figure(carrierDbm, 1)} dBm`);
		expect(text).toContain(
			`57.0 − 22.2 − 4.4 = ${figure(carrierDbm - lost, 1)} dBm at the end of the lead, which is ${figure(dbmToWatts(carrierDbm - lost), 1)} W`
		);
		expect(text).toContain(`With a 20 dB pad first, ${figure(carrierDbm - lost - 20, 1)} dBm arrive`);
		expect(text).toContain(`20 + 4.4 + 22.2 = ${figure(20 + lost, 1)} dB`);
	});

	it('says what this receiver takes', () => {
		expect(text).toContain(`The greatest input of this receiver is +${figure(field.maxSafeInputDbm, 0)} dBm`);
		expect(dbmToWatts(field.maxSafeInputDbm)).toBeCloseTo(0.5, 2);
		expect(carrierDbm - lost).toBeGreaterThan(field.maxSafeInputDbm);
		expect(field.maxSafeInputDbm - (carrierDbm - lost - 20)).toBeGreaterThan(16);
	});

	it('reads a loss between two points of a table', () => {
		const table = [
			{ frequencyHz: 50e6, lossDb: 3.2 },
			{ frequencyHz: 300e6, lossDb: 9.2 }
		];
		const loss = lossDbAt(table, 157e6);
		expect(text).toContain(`3.2 + (157 − 50) / (300 − 50) × (9.2 − 3.2) = ${figure(loss, 1)} dB`);
		expect(text).toContain(`the nearer point instead and you are ${figure(loss - 3.2, 1)} dB out`);
	});
});

describe('Tune and mark', () => {
	const text = lesson('02-tune-and-mark');

	it('says how far apart the points of a trace stand', () => {
		expect(text).toContain('Over 10 MHz that is 10 kHz, so a frequency read there may be 5 kHz out');
		const { spanHz, points } = resolveSettings({ centreHz: 157e6, spanHz: 10e6 }, field);
		expect(spanHz / (points - 1)).toBe(10e3);
	});

	it('says how sure a count is: √6/(2π·T·√(SNR·B·T))', () => {
		// 40 dB over this receiver's own floor in 1 kHz
		const quiet = { ...field, phaseNoise: null, residuals: [], referencePpm: 0, levelErrorDb: 0 };
		const settings = { centreHz: 157e6, spanHz: 100e3, rbwHz: 1000, attenuationDb: 0 };
		const resolved = resolveSettings(settings, quiet);
		const floorDbm = powerRatioToDb(floorDensity(quiet, resolved)(157e6) * noiseBandwidthHz(1000));
		const emitters = [{ kind: 'cw' as const, frequencyHz: 157e6, levelDbm: floorDbm + 40 }];
		const counted = countFrequency({ emitters }, quiet, resolved, 1, { atHz: 157e6, gateS: 0.5 }, 0, 0);
		if ('problem' in counted) throw new Error(counted.problem);
		expect(text).toContain(`√(10 000 · 500)) = ${counted.spread.toFixed(5)} Hz`);
	});

	it('says what the reference leaves open, of a frequency and of a distance', () => {
		const off = (hz: number) => hz * field.referencePpm * 1e-6;
		expect(text).toContain(`at 157 MHz that is ${figure(off(157e6), 0)} Hz`);
		expect(text).toContain(`shows 7.4 GHz up to ${figure(off(7.4e9) / 1e3, 1)} kHz wrong`);
		expect(text).toContain(`a distance of 240 kHz on it ${figure(off(240e3), 2)} Hz wrong`);
	});
});

describe('Resolve', () => {
	const text = lesson('03-resolve');

	it('knows the filter’s shape', () => {
		expect(text).toContain(`${figure(filterLossDb(1, 1), 2)} · (f / B)² dB down`);
		expect(text).toContain(`60 dB at ${figure(filterWidthHz(60, 1) / 2, 2)} widths`);
		expect(text).toContain(`a shape factor 60 dB to 3 dB of ${figure(filterWidthHz(60, 1), 1)}`);
	});

	it.each([
		[10e3, 1],
		[3e3, 1],
		[1e3, 0]
	])('says what a filter of %d Hz shows 3.6 kHz from a carrier 38 dB stronger', (rbwHz, digits) => {
		const loss = filterLossDb(3600, rbwHz);
		const shown = loss < 38 ? `the skirt, ${figure(38 - loss, 0)} dB too high` : 'the weak carrier';
		expect(text).toContain(`| ${rbwHz / 1e3} kHz | ${figure(loss, digits)} dB down | ${shown} |`);
	});

	it('says where this receiver’s own noise ends it', () => {
		const density = field.phaseNoise!.find(({ offsetHz }) => offsetHz === 10e3)!.dbcPerHz;
		const collected = powerRatioToDb(noiseBandwidthHz(300));
		expect(text).toContain(`noise lies ${figure(-density, 0)} dB down in 1 Hz`);
		expect(text).toContain(
			`${figure(noiseBandwidthHz(300), 0)} Hz wide to noise, collects ${figure(collected, 0)} dB`
		);
		expect(text).toContain(`weaker than ${figure(-density - collected, 0)} dB below the carrier`);
	});

	it('says what a narrow filter costs in time', () => {
		const times = [1000, 300, 100].map(
			(rbwHz) => resolveSettings({ centreHz: 450e6, spanHz: 20e3, rbwHz }, field).sweepTimeS
		);
		expect(text).toContain(
			`20 kHz that is ${figure(times[0], 1)} s with 1 kHz, ${figure(times[1], 1)} s with 300 Hz, ${figure(times[2], 0)} s with 100 Hz`
		);
	});

	it('says what too fast a sweep loses', () => {
		const loss = sweepLossDb(100e3 / 0.02, 1000);
		expect(text).toContain(
			`the level is ${figure(loss, 1)} dB low and the needle ${figure(10 ** (loss / 10), 2)} kHz wide`
		);
		expect(figure(sweepLossDb(100e3 / 0.5, 1000), 2)).toBe('0.02');
		expect(text).toContain('loses two hundredths of a decibel');
	});
});

describe.each(['01-connect-safely', '02-tune-and-mark', '03-resolve'])('%s', (folder) => {
	const text = readFileSync(`content/spectrum-measurement/${folder}/lesson.md`, 'utf8');
	const prose = text.replace(/```[\s\S]*?```/g, '');

	it('is 400 to 900 words long', () => {
		const words = prose.split(/\s+/).filter((word) => /\w/.test(word)).length;
		expect(words).toBeGreaterThanOrEqual(400);
		expect(words).toBeLessThanOrEqual(900);
	});

	it('has at least two live figures', () =>
		expect(text.match(/^```figure$/gm)!.length).toBeGreaterThanOrEqual(2));
});
