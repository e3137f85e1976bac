/** Published and computed values of units. Sources stand beside each check; M = quoted from memory, C = computed. */
import { describe, expect, it } from 'vitest';
import { powerRatioToDb, voltageRatioToDb } from '$lib/units/decibel';
import { fieldStrengthDbMicrovoltsPerM } from '$lib/units/field-strength';
import {
	dbmToDbMicrovolts,
	dbmToDbMillivolts,
	dbmToVolts,
	dbmToWatts,
	dbMicrovoltsToDbm,
	dbMillivoltsToDbm,
	voltsToDbm,
	wattsToDbm
} from '$lib/units/level';
import { thermalDensityDbmPerHz } from '$lib/units/thermal-noise';

describe('thermal noise (k exact, SI Brochure 9th ed. M; Pozar, Microwave Engineering 4th ed. §10.1 M; C)', () => {
	it.each([
		[290, -173.97519],
		[293.15, -173.92827],
		[300, -173.82795]
	])('a matched source at %d K delivers %d dBm/Hz', (kelvin, density) =>
		expect(thermalDensityDbmPerHz(kelvin)).toBeCloseTo(density, 4)
	);
	it.each([
		[1e3, -143.97519],
		[10e3, -133.97519],
		[1e6, -113.97519]
	])('in %d Hz at 290 K that is %d dBm', (widthHz, levelDbm) =>
		expect(thermalDensityDbmPerHz() + powerRatioToDb(widthHz)).toBeCloseTo(levelDbm, 4)
	);
});

describe('levels across an impedance (C from P = V²/R)', () => {
	it('0 dBm across 50 Ω is 0.2236068 V, 106.98970 dBµV, 46.98970 dBmV, −13.01030 dBV', () => {
		expect(dbmToVolts(0)).toBeCloseTo(0.2236068, 7);
		expect(dbmToDbMicrovolts(0)).toBeCloseTo(106.9897, 4);
		expect(dbmToDbMillivolts(0)).toBeCloseTo(46.9897, 4);
		expect(voltageRatioToDb(dbmToVolts(0))).toBeCloseTo(-13.0103, 4);
	});
	it('0 dBm across 75 Ω is 108.75061 dBµV', () => expect(dbmToDbMicrovolts(0, 75)).toBeCloseTo(108.75061, 4));
	it('1 µV across 50 Ω is −106.98970 dBm', () => expect(voltsToDbm(1e-6)).toBeCloseTo(-106.9897, 4));
	it('every conversion leads back to where it came from', () => {
		for (const levelDbm of [-120, -47.2, 0, 33]) {
			expect(wattsToDbm(dbmToWatts(levelDbm))).toBeCloseTo(levelDbm, 9);
			expect(voltsToDbm(dbmToVolts(levelDbm, 75), 75)).toBeCloseTo(levelDbm, 9);
			expect(dbMicrovoltsToDbm(dbmToDbMicrovolts(levelDbm))).toBeCloseTo(levelDbm, 9);
			expect(dbMillivoltsToDbm(dbmToDbMillivolts(levelDbm, 75), 75)).toBeCloseTo(levelDbm, 9);
		}
	});
});

describe('field strength (antenna factor of a known gain, 20·log10 f_MHz − G − 29.77371 at 50 Ω; C)', () => {
	it('2.15 dBi at 100 MHz (8.0763 dB/m) and −60 dBm are 55.0660 dBµV/m', () =>
		expect(fieldStrengthDbMicrovoltsPerM(-60, 8.0763)).toBeCloseTo(55.066, 4));
	it('agrees with the power flux through the antenna’s aperture: E² = 120π·P·4π/(G·λ²)', () => {
		// 6 dBi at 1 GHz: antenna factor 24.2263 dB/m.
		const wavelengthM = 299_792_458 / 1e9;
		const apertureM2 = (10 ** 0.6 * wavelengthM ** 2) / (4 * Math.PI);
		const fieldVPerM = Math.sqrt((120 * Math.PI * dbmToWatts(-40)) / apertureM2);
		// 120π Ω and the constant's exact 376.730 Ω differ by 0.0016 dB.
		expect(fieldStrengthDbMicrovoltsPerM(-40, 24.2263)).toBeCloseTo(voltageRatioToDb(fieldVPerM * 1e6), 2);
	});
});
