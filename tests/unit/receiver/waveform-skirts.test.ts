import { describe, expect, it } from 'vitest';
import type { Emitter } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { ideal, meanOf, sweep } from '../../reference/bench-on-paper';

const carrierHz = 450e6;
const qpsk: Emitter = {
	kind: 'digital',
	frequencyHz: carrierHz,
	levelDbm: -20,
	symbolRateHz: 10e3,
	rollOff: 0.25,
	order: 4
};
/** Wide against the symbol rate: the filter follows the waveform. */
const wide: Settings = { centreHz: carrierHz, spanHz: 40e3, rbwHz: 3e3, points: 201, scale: 'power' };
/** Mean levels in dB of `sweeps` rows, point by point. */
function meanRow(settings: Settings, receiver: Parameters<typeof sweep>[0]['receiver'] = ideal): number[] {
	const rows = sweep({
		emitters: [qpsk],
		receiver,
		settings: { ...wide, ...settings },
		sweeps: 32
	}).levelsDbm;
	return rows[0].map((_, i) => 10 * Math.log10(meanOf(rows.map((row) => 10 ** (row[i] / 10)))));
}

describe('a waveform that the filter follows, swept slowly', () => {
	const FAST_S = 0.03;
	const SLOW_S = 4;

	it.each(['average', 'sample'] as const)('has the same flanks as swept quickly, with %s', (detector) => {
		const fast = meanRow({ detector, sweepTimeS: FAST_S });
		const slow = meanRow({ detector, sweepTimeS: SLOW_S });
		// Down to 60 dB under the top: the 3 kHz filter falls by up to 1.6 dB from point to point there.
		for (let i = 60; i <= 140; i += 1) expect(Math.abs(slow[i] - fast[i]), `point ${i}`).toBeLessThan(3);
		expect(Math.abs(meanOf(slow.slice(85, 116)) - meanOf(fast.slice(85, 116)))).toBeLessThan(0.5);
	});

	it('falls from point to point without a stair', () => {
		const slow = meanRow({ detector: 'average', sweepTimeS: SLOW_S });
		const drops = slow.slice(60, 86).map((level, i) => slow[61 + i] - level);
		expect(Math.max(...drops)).toBeLessThan(4);
	});
});

describe('the oscillator’s phase noise beside a waveform', () => {
	it('goes on up to the flank, with no gap between', () => {
		const receiver = {
			...ideal,
			phaseNoise: [
				{ offsetHz: 100, dbcPerHz: -90 },
				{ offsetHz: 1e6, dbcPerHz: -90.1 }
			]
		};
		const row = meanRow({ detector: 'average', sweepTimeS: 0.03 }, receiver);
		// −20 dBm − 90 dBc/Hz + 10 lg(1.0645 · 3 kHz) = −75.0 dBm everywhere beside the signal: theory.
		for (let i = 0; i < 45; i++) expect(Math.abs(row[i] + 75), `point ${i}`).toBeLessThan(2.5);
		expect(Math.abs(meanOf(row.slice(0, 45)) + 75)).toBeLessThan(0.5);
	});
});
