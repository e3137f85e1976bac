import { describe, expect, it } from 'vitest';
import {
	formatFigure,
	formatFrequency,
	formatQuantity,
	formatTime,
	showFrequency
} from '$lib/units/format-quantity';

describe('formatFigure(value, digits)', () => {
	it.each([
		[-47.2, 2, '−47.20'],
		[0.004, 2, '0.00'],
		[-0.004, 2, '0.00'],
		[12, 0, '12']
	])('shows %d to %d decimals as %s', (value, digits, text) =>
		expect(formatFigure(value, digits)).toBe(text)
	);
});

describe('formatQuantity(value, unit, {digits})', () => {
	it('keeps figure and unit on one line', () =>
		expect(formatQuantity(-47.2, 'dBm', { digits: 1 })).toBe('−47.2\u00a0dBm'));
	it('shows a plain number without a unit', () => expect(formatQuantity(2, '1', { digits: 1 })).toBe('2.0'));
});

describe('showFrequency(frequencyHz, digits)', () => {
	it('parts figure and unit, with thin spaces every three decimals', () =>
		expect(showFrequency(1_234_567)).toEqual({ figure: '1.234\u202f567', unit: 'MHz' }));
	it.each([
		[0, '0\u00a0Hz'],
		[999, '999\u00a0Hz'],
		[999_999.9, '1\u00a0MHz'],
		[2.4e9, '2.4\u00a0GHz'],
		[433_920_000, '433.92\u00a0MHz'],
		[-1500, '−1.5\u00a0kHz'],
		[1e9 + 1, '1.000\u202f000\u202f001\u00a0GHz']
	])('shows %d Hz as %s', (frequencyHz, text) => expect(formatFrequency(frequencyHz)).toBe(text));
	it('holds the decimals it is told to, so that a column lines up', () =>
		expect(formatFrequency(433_920_000, 4)).toBe('433.920\u202f0\u00a0MHz'));
});

describe('formatTime(timeS, digits)', () => {
	it.each([
		[0, '0\u00a0s'],
		[0.57, '570\u00a0ms'],
		[20e-6, '20\u00a0µs'],
		[1.5e-9, '2\u00a0ns'],
		[2.25, '2.25\u00a0s']
	])('shows %d s as %s', (timeS, text) => expect(formatTime(timeS)).toBe(text));
});
