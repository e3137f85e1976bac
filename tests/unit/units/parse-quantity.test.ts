import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Dimension } from '$lib/units/dimension';
import { formatFrequency, formatQuantity, formatTime } from '$lib/units/format-quantity';
import { parseQuantity } from '$lib/units/parse-quantity';

const valueOf = (text: string, dimension: Dimension, bareUnit?: string): number => {
	const parsed = parseQuantity(text, dimension, bareUnit);
	if (!parsed.ok) throw new Error(parsed.message);
	return parsed.value;
};
const messageOf = (text: string, dimension: Dimension): string => {
	const parsed = parseQuantity(text, dimension);
	return parsed.ok ? `read as ${parsed.value}` : parsed.message;
};

describe('parseQuantity(text, dimension, bareUnit)', () => {
	it.each<[string, Dimension, number]>([
		['-47.2 dBm', 'level', -47.2],
		['-47,2', 'level', -47.2],
		['−47.2', 'level', -47.2],
		['– 47.2dbm', 'level', -47.2],
		['+3 dBm', 'level', 3],
		['1 mW', 'level', 0],
		['2 W', 'level', 33.0103],
		['0.2236068 V', 'level', 0],
		['107 dBuV', 'level', 0.0103],
		['47 dBmV', 'level', 0.0103],
		['1 uV', 'level', -106.9897],
		['1 μV', 'level', -106.9897],
		['-143.9 dbm/hz', 'density', -143.9],
		['-92 dBc/Hz', 'relative-density', -92],
		['30 %', 'share', 30],
		['12', 'number', 12]
	])('reads “%s” as a %s of %d', (text, dimension, value) =>
		expect(valueOf(text, dimension)).toBeCloseTo(value, 3)
	);

	it.each<[string, number]>([
		['1.23 MHz', 1.23e6],
		['1230 kHz', 1.23e6],
		['1,23 mhz', 1.23e6],
		['2.4G', 2.4e9],
		['100k', 100e3],
		['100 K', 100e3],
		['2.4 GHz', 2.4e9],
		['433.920 000 MHz', 433.92e6],
		['1 230 000', 1.23e6],
		['1\u2009230\u2009000 Hz', 1.23e6],
		['.5M', 5e5],
		['5. kHz', 5e3],
		['1e6', 1e6],
		['1.5e3kHz', 1.5e6],
		['0,125 MHz', 125e3],
		['1000,500 kHz', 1000500]
	])('reads “%s” as a frequency of %d Hz', (text, value) =>
		expect(valueOf(text, 'frequency')).toBeCloseTo(value, 6)
	);

	it.each<[string, number]>([
		['570 ms', 0.57],
		['570m', 0.57],
		['20 us', 20e-6],
		['20µ', 20e-6],
		['2 s', 2],
		['2', 2]
	])('reads “%s” as a time of %d s', (text, value) => expect(valueOf(text, 'time')).toBeCloseTo(value, 12));

	it('takes a number without a unit in the unit that stands beside the field', () =>
		expect(valueOf('433.92', 'frequency', 'MHz')).toBeCloseTo(433.92e6, 3));

	it('names what was expected and what was typed when the dimension is wrong', () => {
		expect(messageOf('570 ms', 'frequency')).toBe(
			'Expected a frequency in Hz, kHz, MHz or GHz: ms is a time.'
		);
		expect(messageOf('-40 dBm', 'ratio')).toBe('Expected a ratio in dB: dBm is a level.');
		expect(messageOf('-40 dBc', 'level')).toContain('dBc is a level against the carrier');
		expect(messageOf('5 MHz', 'number')).toContain('MHz is a frequency');
		expect(messageOf('-40 dBx', 'level')).toContain('there is no unit “dBx” here');
	});

	it.each<[string, Dimension, string]>([
		['', 'level', 'Nothing was typed.'],
		['forty', 'level', 'does not start with a number'],
		['1,230 kHz', 'frequency', 'could be 1.230 or 1230'],
		['1.230.000', 'frequency', 'more than one decimal sign'],
		['12 34', 'level', 'more than one number'],
		['10 mHz', 'frequency', 'write MHz or M'],
		['10m', 'frequency', 'write MHz or M'],
		['1 MW', 'level', 'there is no unit “MW” here'],
		['1 constructor', 'level', 'there is no unit'],
		['-3 W', 'level', 'must be greater than 0'],
		['0 V', 'level', 'must be greater than 0'],
		['1e400', 'number', 'too large']
	])('refuses “%s” as a %s', (text, dimension, message) =>
		expect(messageOf(text, dimension)).toContain(message)
	);

	it('reads back every frequency as it is shown, to half a hertz', () =>
		fc.assert(
			fc.property(fc.double({ min: 0, max: 100e9, noNaN: true }), (frequencyHz) => {
				expect(Math.abs(valueOf(formatFrequency(frequencyHz), 'frequency') - frequencyHz)).toBeLessThan(
					0.501
				);
			})
		));

	it('reads back every time as it is shown, to half a nanosecond', () =>
		fc.assert(
			fc.property(fc.double({ min: 0, max: 2000, noNaN: true }), (timeS) => {
				expect(Math.abs(valueOf(formatTime(timeS), 'time') - timeS)).toBeLessThan(0.501e-9);
			})
		));

	it('reads back every level as it is shown', () =>
		fc.assert(
			fc.property(fc.double({ min: -250, max: 100, noNaN: true }), (levelDbm) => {
				expect(
					Math.abs(valueOf(formatQuantity(levelDbm, 'dBm', { digits: 2 }), 'level') - levelDbm)
				).toBeLessThan(0.00501);
			})
		));

	it('answers any text with a finite number or a sentence, never anything else', () =>
		fc.assert(
			fc.property(
				fc.string(),
				fc.constantFrom<Dimension>('level', 'frequency', 'time', 'number'),
				(text, dimension) => {
					const parsed = parseQuantity(text, dimension);
					expect(parsed.ok ? Number.isFinite(parsed.value) : parsed.message.length > 0).toBe(true);
				}
			)
		));
});
