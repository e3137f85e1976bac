import { describe, expect, it } from 'vitest';
import type { SetUp } from '$lib/server/bench/grading/mistake';
import {
	averagesDecibels,
	crestPower,
	LOG_AVERAGE_DB,
	pointSpreadDb,
	shownPower
} from '$lib/server/bench/grading/noise-law';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import type { Settings } from '$lib/schemas/settings';

function setUp(settings: Settings, sweeps: number): SetUp {
	const resolved = resolveSettings({ centreHz: 450e6, spanHz: 80e3, rbwHz: 300, ...settings }, field);
	return { resolved, trace: resolved.traces[0], sweeps };
}
/** Σ 1/k: the mean of the greatest of n standard exponentials. */
const harmonic = (n: number) => Array.from({ length: n }, (_, i) => 1 / (i + 1)).reduce((a, b) => a + b, 0);

describe('how noise is shown', () => {
	it('reads at its mean power without peaks or holds', () =>
		expect(shownPower(setUp({ detector: 'average', scale: 'power' }, 16))).toBe(1));

	it.each([1, 4, 16, 64])('held over %d sweeps of samples, stands at the harmonic number', (sweeps) =>
		expect(shownPower(setUp({ detector: 'sample', traces: [{ mode: 'max-hold' }] }, sweeps))).toBeCloseTo(
			harmonic(sweeps),
			2
		)
	);

	it('has its crest at the harmonic number of its points, nearer the mean the more is averaged', () => {
		const samples: Settings = { detector: 'sample', scale: 'power', points: 501, sweepTimeS: 4 };
		expect(crestPower(setUp(samples, 1))).toBeCloseTo(harmonic(501), 1);
		const averaged = setUp({ ...samples, traces: [{ mode: 'average', count: 100 }] }, 100);
		// The mean of a hundred scatters by a tenth; the greatest of 501 normal numbers stands 3.04 over their mean (from memory).
		expect(crestPower(averaged)).toBeGreaterThan(1.3);
		expect(crestPower(averaged)).toBeLessThan(1.4);
	});

	it('reads higher the longer it is held, and with a peak detector', () => {
		const held = (sweeps: number) => shownPower(setUp({ traces: [{ mode: 'max-hold' }] }, sweeps));
		expect(held(32)).toBeGreaterThan(held(8));
		expect(shownPower(setUp({ detector: 'positive-peak' }, 1))).toBeGreaterThan(1.5);
		expect(shownPower(setUp({ detector: 'negative-peak' }, 1))).toBeLessThan(0.5);
	});

	it.each([4, 16, 64])(
		'held at the minimum over %d sweeps, falls as one over them, and no lower than a video filter fills it',
		(sweeps) => {
			const held = (vbwHz: number) =>
				shownPower(
					setUp({ detector: 'sample', scale: 'power', vbwHz, traces: [{ mode: 'min-hold' }] }, sweeps)
				);
			// The least of n standard exponentials has mean 1/n (Rényi 1953, from memory).
			expect(held(300e3) * sweeps).toBeCloseTo(1, 1);
			expect(held(900)).toBeGreaterThan(held(300e3));
		}
	);

	it('averaged in decibels stands 10·γ/ln 10 = 2.507 dB low', () =>
		expect(LOG_AVERAGE_DB).toBeCloseTo((10 * 0.5772156649) / Math.LN10, 4));

	it('scatters by 5.57 dB in one sample, less by the root of the rows', () => {
		// π/√6 nepers of power: 5.570 dB (checks.md A).
		expect(pointSpreadDb(setUp({ detector: 'sample' }, 1))).toBeCloseTo(
			((Math.PI / Math.sqrt(6)) * 10) / Math.LN10,
			2
		);
		const averaged = setUp({ detector: 'sample', traces: [{ mode: 'average', count: 100 }] }, 100);
		expect(pointSpreadDb(averaged)).toBeCloseTo(0.557, 3);
	});

	it('counts as averaged in decibels by rows, by detector and by a narrow video filter, on the log scale only', () => {
		const average = { traces: [{ mode: 'average' as const, count: 8 }] };
		expect(averagesDecibels(setUp({ ...average, scale: 'log' }, 8))).toBe(true);
		expect(averagesDecibels(setUp({ detector: 'average' }, 1))).toBe(true);
		expect(averagesDecibels(setUp({ vbwHz: 10 }, 1))).toBe(true);
		expect(averagesDecibels(setUp({ ...average, scale: 'power' }, 8))).toBe(false);
		expect(averagesDecibels(setUp({ detector: 'sample' }, 1))).toBe(false);
	});
});
