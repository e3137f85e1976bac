import { describe, expect, it } from 'vitest';
import { ideal, meanPowerDbm, sweep } from '../../reference/bench-on-paper';

const noisy = {
	...ideal,
	phaseNoise: [
		{ offsetHz: 1e3, dbcPerHz: -85 },
		{ offsetHz: 1e6, dbcPerHz: -85 }
	]
};
const carrier = { kind: 'cw' as const, frequencyHz: 1e9, levelDbm: -10 };

describe('phase noise about a carrier', () => {
	it.each([0.02, 4])('joins the skirt to the line without a gap at 3.5 B (sweep of %d s)', (sweepTimeS) => {
		const rbwHz = 10e3;
		const rows = sweep({
			emitters: [carrier],
			receiver: noisy,
			settings: {
				startHz: 1e9,
				stopHz: 1.0001e9,
				rbwHz,
				vbwHz: 10e6,
				sweepTimeS,
				detector: 'average',
				scale: 'power'
			},
			sweeps: 200
		}).levelsDbm;
		const at = (offsetPerRbw: number) => {
			const i = Math.round((offsetPerRbw * rbwHz) / 100);
			return meanPowerDbm(rows.flatMap((row) => row.slice(i - 3, i + 4)));
		};
		// −85 dBc/Hz in 10.64 kHz of noise bandwidth
		const skirt = -10 - 85 + 10 * Math.log10(1.064467 * rbwHz);
		for (const offset of [2.8, 3.2, 3.45, 3.55, 4, 6])
			expect(Math.abs(at(offset) - skirt), `${offset} B`).toBeLessThan(0.6);
	});

	it('turns the phase and leaves the level while it is inside the filter', () => {
		const close = [
			{
				...carrier,
				phaseNoise: [
					{ offsetHz: 10, dbcPerHz: -55 },
					{ offsetHz: 100, dbcPerHz: -55 }
				]
			}
		];
		const settings = {
			centreHz: 1e9,
			spanHz: 0,
			rbwHz: 100e3,
			vbwHz: 10e6,
			sweepTimeS: 0.02,
			detector: 'sample' as const
		};
		const row = sweep({ emitters: close, settings }).levelsDbm[0];
		expect(Math.max(...row) - Math.min(...row)).toBeLessThan(0.3);
	});
});
