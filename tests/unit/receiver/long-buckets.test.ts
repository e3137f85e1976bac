import { describe, expect, it } from 'vitest';
import type { Emitter } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { ideal, meanOf, sweep } from '../../reference/bench-on-paper';

const rbwHz = 10e3;
const points = 201;
/** Mean and deviation in dB of rows whose buckets last `bt`/B. */
function shown(bt: number, settings: Settings, emitters: Emitter[] = [], sweeps = 24) {
	const all = sweep({
		emitters,
		receiver: { ...ideal, noiseFigureDb: [{ frequencyHz: 1e9, db: 20 }] },
		settings: {
			startHz: 1e9,
			stopHz: 1.0002e9,
			rbwHz,
			points,
			sweepTimeS: (bt / rbwHz) * (points - 1),
			...settings
		},
		sweeps
	}).levelsDbm.flat();
	const mean = meanOf(all);
	return { mean, deviation: Math.sqrt(meanOf(all.map((l) => (l - mean) ** 2))) };
}

describe('buckets just short enough to be sampled, and just too long', () => {
	const detectors = ['positive-peak', 'negative-peak', 'average', 'sample'] as const;
	const scales = ['log', 'power', 'voltage'] as const;
	const cases = detectors.flatMap((detector) => scales.map((scale) => [detector, scale] as const));

	it.each(cases)('show the same noise with %s on %s', (detector, scale) => {
		const settings = { detector, scale, vbwHz: 10e6 };
		const short = shown(3.95, settings);
		const long = shown(4.05, settings);
		const least = detector === 'negative-peak' ? 0.7 : 0.2;
		expect(Math.abs(long.mean - short.mean)).toBeLessThan(least);
		expect(Math.abs(long.deviation / short.deviation - 1)).toBeLessThan(0.15);
	});

	it.each([0.1, 0.5, 3])('and with a video filter of %d B', (ratio) => {
		for (const detector of ['positive-peak', 'average', 'sample'] as const) {
			const settings = { detector, scale: 'log' as const, vbwHz: ratio * rbwHz };
			expect(Math.abs(shown(4.05, settings).mean - shown(3.95, settings).mean)).toBeLessThan(0.3);
		}
	});

	it('show the same carrier in noise with a peak detector', () => {
		for (const snrDb of [0, 6, 15]) {
			const settings = {
				startHz: undefined,
				stopHz: undefined,
				centreHz: 1e9,
				spanHz: 0,
				detector: 'positive-peak' as const,
				vbwHz: 10e6
			};
			const noiseDbm = -173.975 + 20 + 10 * Math.log10(1.064467 * rbwHz);
			const carrier: Emitter[] = [{ kind: 'cw', frequencyHz: 1e9, levelDbm: noiseDbm + snrDb }];
			const difference = shown(4.05, settings, carrier).mean - shown(3.95, settings, carrier).mean;
			expect(Math.abs(difference), `${snrDb} dB`).toBeLessThan(0.25);
		}
	});
});

describe('a narrow video filter', () => {
	it.each(['positive-peak', 'negative-peak', 'sample'] as const)(
		'shows the same with %s before and after it settles within a bucket',
		(detector) => {
			const at = (perVideo: number) => shown(perVideo * 100, { detector, vbwHz: rbwHz / 100 }, [], 12);
			expect(Math.abs(at(1.55).mean - at(1.45).mean)).toBeLessThan(0.2);
		}
	);
});

describe('waveforms', () => {
	it.each(['positive-peak', 'average'] as const)(
		'look alike sampled and drawn from a pool, with %s',
		(detector) => {
			const qpsk: Emitter[] = [
				{ kind: 'digital', frequencyHz: 1e9, levelDbm: -30, symbolRateHz: 19.37e3, rollOff: 0.35, order: 4 }
			];
			const mean = (points: number) =>
				meanOf(
					sweep({
						emitters: qpsk,
						settings: {
							centreHz: 1e9,
							spanHz: 0,
							rbwHz,
							vbwHz: 10e6,
							points,
							sweepTimeS: (12 / rbwHz) * (points - 1),
							detector
						},
						sweeps: 40
					}).levelsDbm.flat()
				);
			// 101 points are followed sample by sample; 1001 would take too many and are drawn
			expect(Math.abs(mean(1001) - mean(101))).toBeLessThan(0.25);
		}
	);

	it('of constant envelope stay constant through a wide filter, however slow the sweep', () => {
		const msk: Emitter[] = [{ kind: 'msk', frequencyHz: 1e9, levelDbm: -30, bitRateHz: 10e3 }];
		const settings = {
			centreHz: 1e9,
			spanHz: 0,
			rbwHz: 300e3,
			vbwHz: 10e6,
			sweepTimeS: 20,
			detector: 'positive-peak' as const
		};
		const row = sweep({ emitters: msk, settings }).levelsDbm[0];
		expect(Math.max(...row) - Math.min(...row)).toBeLessThan(0.3);
	});
});
