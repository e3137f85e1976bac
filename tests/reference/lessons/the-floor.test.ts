/** The numbers worked out in the lesson of unit 4 are the product's own: each is computed here and looked for in the text. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { noiseBiasDb } from '$lib/measure/scale';
import { noiseBandwidthHz } from '$lib/measure/resolution-filter';
import { figure } from '$lib/server/bench/exercise/figure';
import { cascadeNoiseFactor, floorDensity } from '$lib/server/bench/receiver/front-end/floor';
import { field } from '$lib/server/bench/receiver/profiles';
import { tableDb } from '$lib/server/bench/receiver/table-db';
import { dbToPowerRatio, dbmToMilliwatts, milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { thermalDensityDbmPerHz } from '$lib/units/thermal-noise';

const text = readFileSync('content/spectrum-measurement/04-the-floor/lesson.md', 'utf8').replace(/\s+/g, ' ');
const AT_HZ = 160e6;
const RBW_HZ = 1e3;
const floor = (attenuationDb: number, preamp: boolean): number =>
	milliwattsToDbm(floorDensity(field, { attenuationDb, preamp })(AT_HZ));
const inFilter = (dbmPerHz: number): number => dbmPerHz + powerRatioToDb(noiseBandwidthHz(RBW_HZ));

describe('The floor, with numbers', () => {
	it('starts at k·T₀ and adds this receiver’s noise figure', () => {
		expect(text).toContain(`A matched resistor at 290 K gives ${figure(thermalDensityDbmPerHz(), 1)} dBm`);
		expect(text).toContain(`noise figure is ${figure(tableDb(field.noiseFigureDb, AT_HZ), 1)} dB`);
		expect(text).toContain(`its floor is ${figure(floor(0, false), 1)} dBm/Hz`);
	});

	it('fills a 1 kHz filter, averaged as power, in decibels, and behind an attenuator', () => {
		const widthHz = noiseBandwidthHz(RBW_HZ);
		expect(text).toContain(`${figure(widthHz, 0)} Hz, or ${figure(powerRatioToDb(widthHz), 1)} dB`);
		expect(text).toContain(`the trace stands at ${figure(inFilter(floor(0, false)), 1)} dBm`);
		expect(text).toContain(`it stands at ${figure(inFilter(floor(10, false)), 1)} dBm`);
		const logged = inFilter(floor(0, false)) - noiseBiasDb.log;
		expect(text).toContain(
			`${figure(noiseBiasDb.log, 2)} dB lower (10γ/ln 10, γ = 0.5772): ${figure(logged, 1)} dBm instead of ${figure(inFilter(floor(0, false)), 1)}`
		);
		const bandwidthDb = powerRatioToDb(noiseBandwidthHz(1));
		expect(text).toContain(
			`you are 2.51 − ${figure(bandwidthDb, 2)} = ${figure(noiseBiasDb.log - bandwidthDb, 2)} dB low`
		);
	});

	it('drops by what Friis’ formula gives for the preamplifier', () => {
		const { gainDb, noiseFigureDb } = field.preamp!;
		const own = dbToPowerRatio(tableDb(noiseFigureDb, AT_HZ));
		const rest = dbToPowerRatio(tableDb(field.noiseFigureDb, AT_HZ));
		const gain = dbToPowerRatio(gainDb);
		const together = cascadeNoiseFactor([
			{ gain, noiseFactor: own },
			{ gain: 1, noiseFactor: rest }
		]);
		expect(text).toContain(
			`${figure(gainDb, 1)} dB of gain with ${figure(powerRatioToDb(own), 1)} dB of noise figure: ${figure(own, 1)} + ${figure(rest - 1, 1)}/${figure(gain, 1)} = ${figure(together, 1)}, which is ${figure(powerRatioToDb(together), 1)} dB`
		);
		const drop = floor(0, false) - floor(0, true);
		expect(text).toContain(`drops to ${figure(floor(0, true), 1)} dBm/Hz, ${figure(drop, 1)} dB lower`);
	});
});

describe('Whose noise is it?', () => {
	it('takes the load’s noise off the antenna’s in milliwatts', () => {
		const [withAntenna, withLoad] = [-162.4, -165.9];
		expect(figure(floor(0, true), 1)).toBe(figure(withLoad, 1));
		const [a, b] = [withAntenna, withLoad].map((level) => dbmToMilliwatts(level) * 1e17);
		const own = milliwattsToDbm((a - b) * 1e-17);
		expect(text).toContain(
			`10 log (${figure(a, 2)} − ${figure(b, 2)}) × 10⁻¹⁷ mW = ${figure(own, 1)} dBm/Hz`
		);
		expect(text).toContain(`your noise made it ${figure(withAntenna - own, 1)} dB too high`);
	});

	it.each([10, 6, 3, 1])('a drop of %d dB takes off what the table says', (dropDb) => {
		const takeOff = -powerRatioToDb(1 - dbToPowerRatio(-dropDb));
		expect(text).toMatch(new RegExp(`\\| ${dropDb} dB +\\| ${figure(takeOff, 1)} dB`));
	});
});
