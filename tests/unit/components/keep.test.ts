import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { BenchSnapshot } from '$lib/components/bench/keep/bench-snapshot';
import { dataCsv, textCell } from '$lib/components/bench/keep/data-csv';
import { fileName } from '$lib/components/bench/keep/save-file';
import { readSetUp, writeSetUp } from '$lib/components/bench/keep/set-up-file';
import { resolved } from './resolved-settings';

const at = new Date('2026-03-02T10:00:00Z');
const snapshot: BenchSnapshot = {
	settings: {},
	resolved: { ...resolved, referenceDbm: -10 },
	axis: { kind: 'frequency', start: 449e6, stop: 451e6 },
	traces: [
		{ words: '1 Average of 16', levelsDbm: [-47.1234, NaN, -50] },
		{ words: '2 Hold maximum', levelsDbm: [-40, -41, -42] }
	],
	markers: [],
	bands: [],
	sweep: 'Sweep 14',
	title: 'Channel power, “telemetry”',
	order: 'Work order 6.1, first attempt',
	client: '=HYPERLINK("http://example.org")',
	receiver: 'field'
};

/** Text that a spreadsheet takes for a formula. */
const formula = /^"?[=+\-@\t\r]/;

describe('dataCsv(snapshot, {who, at})', () => {
	const lines = dataCsv(snapshot, { who: '-2+3', at }).split('\r\n');

	it('says in its header lines what was set, who and when', () => {
		expect(lines).toContain('At,2026-03-02T10:00:00.000Z');
		expect(lines).toContain('Sweep,Sweep 14');
		expect(lines).toContain('Tune,"centre 450 MHz, span 2 MHz (449 MHz to 451 MHz)"');
		expect(lines.find((line) => line.startsWith('Level'))).toContain('reference -10 dBm');
	});

	it('gives one line a point, blank where nothing was swept', () => {
		const head = lines.indexOf('');
		expect(lines.slice(head + 1, head + 5)).toEqual([
			'frequency_Hz,"1 Average of 16, dBm","2 Hold maximum, dBm"',
			'449000000.000,-47.123,-40.000',
			'450000000.000,,-41.000',
			'451000000.000,-50.000,-42.000'
		]);
	});

	it('lets no text be taken for a formula', () => {
		expect(lines).toContain(`For,"'=HYPERLINK(""http://example.org"")"`);
		expect(lines).toContain("By,'-2+3");
		fc.assert(fc.property(fc.string(), (text) => !formula.test(textCell(text))));
	});
});

describe('a set-up file', () => {
	const settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 'auto' as const };

	it('reads back what was written', () => {
		expect(readSetUp(writeSetUp(settings, 'field', at))).toEqual({ ok: true, settings });
	});

	it('is refused with the names of the fields that are wrong', () => {
		const bent = writeSetUp(settings, 'field', at).replace('"rbwHz": "auto"', '"rbwHz": -5, "points": 3');
		expect(readSetUp(bent)).toMatchObject({ ok: false });
		expect((readSetUp(bent) as { message: string }).message).toMatch(
			/Resolution: .*; Points: must be at least 101/
		);
	});

	it.each([
		['no JSON', 'x'],
		['a list', '[]'],
		['another program’s file', '{"settings":{}}'],
		['something far too long', ' '.repeat(70_000)]
	])('%s is refused in words', (_, text) => {
		expect(readSetUp(text)).toMatchObject({ ok: false, message: expect.stringMatching(/^That file is/) });
	});
});

describe('fileName(…)', () => {
	it('keeps to letters, digits and hyphens', () => {
		expect(fileName('Channel power, 6.1', 'sweep 3')).toBe('channel-power-6-1-sweep-3');
		expect(fileName('../..//x')).toBe('x');
	});
});
