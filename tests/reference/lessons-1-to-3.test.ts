/** The numbers worked out in the lessons of units 1 to 3 are the product's own: each is computed here and looked for in the text. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { figure } from '$lib/server/bench/exercise/figure';
import { lossDbAt } from '$lib/server/bench/exercise/loss-db-at';
import { field } from '$lib/server/bench/receiver/profiles';
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

describe.each(['01-connect-safely'])('%s', (folder) => {
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
