/**
 * J. Pulsed carriers. Source: Fourier series (values computed); NTIA TR-05-420 (2005) and ITU-R M.1177 are the measurement references
 * (titles and contents read only).
 */
import { describe, expect, it } from 'vitest';
import type { Emitter } from '$lib/schemas/scene';
import { sweep } from './bench-on-paper';

const pulsed = (widthS: number, periodS: number): Emitter[] => [
	{ kind: 'pulsed', frequencyHz: 2.9e9, levelDbm: 0, widthS, periodS }
];
const peakOf = (row: number[]): number => Math.max(...row);

describe('line mode: RBW far below the repetition rate', () => {
	it.each([
		[1e-6, -60],
		[10e-6, -40]
	])('a pulse of %d s at 1 kHz shows its centre line at %d dB (J2)', (widthS, db) => {
		const settings = {
			centreHz: 2.9e9,
			spanHz: 500,
			rbwHz: 30,
			vbwHz: 10e6,
			sweepTimeS: 5,
			detector: 'positive-peak' as const
		};
		expect(
			Math.abs(peakOf(sweep({ emitters: pulsed(widthS, 1e-3), settings }).levelsDbm[0]) - db)
		).toBeLessThan(0.05);
	});

	it('does not change with the resolution bandwidth, as long as it is a line', () => {
		const at = (rbwHz: number) =>
			peakOf(
				sweep({
					emitters: pulsed(1e-6, 1e-4),
					settings: {
						centreHz: 2.9e9,
						spanHz: 5e3,
						rbwHz,
						vbwHz: 10e6,
						sweepTimeS: 2,
						detector: 'positive-peak'
					}
				}).levelsDbm[0]
			);
		expect(Math.abs(at(300) - at(1000))).toBeLessThan(0.05);
	});
});

describe('pulse mode: repetition rate far below RBW, RBW far below 1/width', () => {
	it.each([
		[1e-6, 10e3, -36.447],
		[2e-6, 30e3, -20.884],
		[0.5e-6, 100e3, -22.468]
	])('a pulse of %d s in %d Hz reads 20·lg(τ·1.5054·B) = %d dB (J3)', (widthS, rbwHz, db) => {
		const settings = {
			centreHz: 2.9e9,
			spanHz: 0,
			rbwHz,
			vbwHz: 10e6,
			sweepTimeS: 1,
			points: 101,
			detector: 'positive-peak' as const
		};
		expect(
			Math.abs(peakOf(sweep({ emitters: pulsed(widthS, 0.0123), settings }).levelsDbm[0]) - db)
		).toBeLessThan(0.1);
	});

	it('rises 20 dB for ten times the resolution bandwidth', () => {
		const at = (rbwHz: number) =>
			peakOf(
				sweep({
					emitters: pulsed(1e-6, 0.01),
					settings: {
						centreHz: 2.9e9,
						spanHz: 0,
						rbwHz,
						vbwHz: 100e6,
						sweepTimeS: 1,
						points: 101,
						detector: 'positive-peak'
					}
				}).levelsDbm[0]
			);
		expect(at(100e3) - at(10e3)).toBeCloseTo(20, 0);
	});
});

describe('span 0 with RBW of at least 2/width (J5)', () => {
	const row = sweep({
		emitters: pulsed(10e-6, 100e-6),
		settings: {
			centreHz: 2.9e9,
			spanHz: 0,
			rbwHz: 1e6,
			vbwHz: 100e6,
			sweepTimeS: 0.001,
			points: 10001,
			detector: 'sample'
		}
	}).levelsDbm[0];
	const volts = row.map((l) => 10 ** (l / 20));
	const rises = volts.flatMap((v, i) => (i > 0 && volts[i - 1] < 0.5 && v >= 0.5 ? [i] : []));

	it('shows the pulse’s peak', () => expect(Math.abs(peakOf(row))).toBeLessThan(0.01));
	it('its width at half voltage', () => {
		const fall = volts.findIndex((v, i) => i > rises[1] && v < 0.5);
		expect((fall - rises[1]) * 0.1e-6).toBeCloseTo(10e-6, 6);
	});
	it('and its repetition', () => expect((rises[2] - rises[1]) * 0.1e-6).toBeCloseTo(100e-6, 6));
});
