/** The numbers worked out in the lesson of unit 5 are the product's own: each is computed here and looked for in the text. */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { figure } from '$lib/server/bench/exercise/figure';
import { shownPower } from '$lib/server/bench/grading/noise-law';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import { powerRatioToDb } from '$lib/units/decibel';

const text = readFileSync('content/spectrum-measurement/05-detectors-and-traces/lesson.md', 'utf8').replace(
	/\s+/g,
	' '
);
const quick = resolveSettings({ centreHz: 161.5e6, spanHz: 100e3, rbwHz: 10e3, points: 201 }, field);

describe('What a point keeps', () => {
	it.each([10, 100])('the highest of %d samples of noise stands where the lesson says', (count) => {
		const held = resolveSettings(
			{ centreHz: 161.5e6, spanHz: 100e3, detector: 'sample', traces: [{ mode: 'max-hold' }] },
			field
		);
		const shown = shownPower({ resolved: held, trace: held.traces[0], sweeps: count });
		// 10 lg(1 + 1/2 + … + 1/n): Rényi 1953, from memory.
		const harmonic = Array.from({ length: count }, (_, i) => 1 / (i + 1)).reduce((sum, x) => sum + x, 0);
		expect(powerRatioToDb(shown)).toBeCloseTo(powerRatioToDb(harmonic), 1);
		const stands = figure(powerRatioToDb(harmonic), 1);
		expect(text).toContain(
			count === 10 ? `stands ${stands} dB over the mean` : `it stands ${stands} dB over`
		);
	});
});

describe('Catching what comes and goes', () => {
	const onS = 0.04;
	const periodS = 1.2;

	it('has the share of the time, and what it costs an average', () => {
		expect(text).toContain(`40/1200, about ${figure((100 * onS) / periodS, 0)} %, of passing its frequency`);
		expect(text).toContain(`10 log (40/1200) = ${figure(powerRatioToDb(onS / periodS), 1)} dB`);
	});

	it('sweeps as quickly as the receiver does, retrace included, and 80 times in more than a period', () => {
		expect(text).toContain(
			`100 kHz with 10 kHz takes ${figure(1e3 * quick.sweepTimeS, 0)} ms, and up to 20 ms more`
		);
		const sweeper = prepareSweep({ emitters: [] }, field, quick, 1);
		const cyclesS = Array.from({ length: 80 }, (_, n) => sweeper.durationS(n));
		expect(Math.max(...cyclesS)).toBeLessThan(0.0252);
		expect(Math.max(...cyclesS)).toBeLessThan(onS);
		expect(cyclesS.reduce((sum, x) => sum + x, 0)).toBeGreaterThan(periodS);
		expect(text).toContain('80 sweeps take at least 1.2 s');
	});
});
