/**
 * A, B, C. Noise as the screen shows it: k·T₀·B·F (SI Brochure 9th ed., k exact; Friis 1944), log-average bias (exponential law of
 * noise power: Rice 1944/45; digamma DLMF §5.4), statistics of averages, effective independent values, rise times.
 * Values computed (see each); tolerances four standard errors with a seed picked before looking.
 */
import { describe, expect, it } from 'vitest';
import { meanOf, meanPowerDbm, modelAnalyser, sweep } from './bench-on-paper';

const settings = {
	startHz: 900e6,
	stopHz: 910e6,
	rbwHz: 10e3,
	vbwHz: 10e6,
	sweepTimeS: 4,
	detector: 'sample' as const
};
const rows = (over: object, sweeps = 60) =>
	sweep({ receiver: modelAnalyser, settings: { ...settings, ...over }, sweeps }).levelsDbm.flat();

describe('the floor of a receiver of NF 24 dB', () => {
	it('is −109.704 dBm in 10 kHz, averaged as power (A5)', () => {
		const levels = rows({});
		expect(Math.abs(meanPowerDbm(levels) + 109.704)).toBeLessThan((4 * 4.343) / Math.sqrt(levels.length));
	});

	it('is −112.211 dBm averaged as logarithm: 2.5068 dB lower (A5, B1), with a deviation of 5.570 dB', () => {
		const levels = rows({});
		const mean = meanOf(levels);
		expect(Math.abs(mean + 112.211)).toBeLessThan((4 * 5.57) / Math.sqrt(levels.length));
		expect(Math.sqrt(meanOf(levels.map((l) => (l - mean) ** 2)))).toBeCloseTo(5.570043, 1);
	});

	it('stands exactly 10 dB higher behind 10 dB of attenuation: −102.211 dBm (A6)', () => {
		const levels = rows({ attenuationDb: 10 });
		expect(Math.abs(meanOf(levels) + 102.211)).toBeLessThan((4 * 5.57) / Math.sqrt(levels.length));
	});

	it('averaged as voltage reads √(π/4) of its r.m.s.: −1.049 dB', () => {
		const levels = rows({ detector: 'average', scale: 'voltage' });
		const voltage = 20 * Math.log10(meanOf(levels.map((l) => 10 ** (l / 20))));
		expect(voltage + 109.704).toBeCloseTo(-1.0491, 1);
	});
});

describe('averages of noise (C)', () => {
	const spread = (over: object) => {
		const levels = rows(over, 40);
		const mean = meanOf(levels);
		return Math.sqrt(meanOf(levels.map((l) => (l - mean) ** 2)));
	};

	it.each([10, 100])(
		'a power average over %d independent values deviates by 4.343·√ψ₁(N) (C3: 1.4084, 0.43538 dB)',
		(n) => {
			const trace = { traces: [{ mode: 'average' as const, count: n }] };
			const result = sweep({
				receiver: modelAnalyser,
				settings: { ...settings, scale: 'power', ...trace },
				sweeps: n
			});
			const levels = result.traces[0].levelsDbm;
			const mean = meanOf(levels);
			const deviation = Math.sqrt(meanOf(levels.map((l) => (l - mean) ** 2)));
			const expected = n === 10 ? 1.4084 : 0.43538;
			expect(Math.abs(deviation / expected - 1)).toBeLessThan(4 / Math.sqrt(2 * levels.length));
		}
	);

	it('an average detector gathers 1.5054·B·T independent powers and 1.8459·B·T logarithms (C6)', () => {
		const bt = 40; // B·T of one bucket
		const long = { detector: 'average', sweepTimeS: 0.004 * 1000 };
		const power = spread({ ...long, scale: 'power' });
		expect(power / (4.343 / Math.sqrt(1.5054 * bt))).toBeCloseTo(1, 1);
		const log = spread({ ...long, scale: 'log' });
		expect(log / (5.57 / Math.sqrt(1.8459 * bt))).toBeCloseTo(1, 1);
	});

	it('through a video filter of B/100 deviates by 5.570·√(π·VBW/(1.8459·B)) dB (C7 of the worked task: 0.72 dB)', () => {
		const deviation = spread({ detector: 'sample', vbwHz: 100, sweepTimeS: 30 });
		expect(Math.abs(deviation - 5.57 * Math.sqrt((Math.PI * 100) / (1.8459 * 10e3)))).toBeLessThan(0.03);
	});
});

describe('rise times (C10, computed)', () => {
	const rise = (over: object, resolution: number): number => {
		const gate = { onS: 0.5, offS: 0.5, startS: 0.001 };
		const result = sweep({
			emitters: [{ kind: 'cw', frequencyHz: 1e9, levelDbm: 0, gate }],
			settings: {
				centreHz: 1e9,
				spanHz: 0,
				points: 2001,
				detector: 'sample',
				scale: 'voltage',
				sweepTimeS: 0.002,
				...over
			}
		});
		const volts = result.levelsDbm[0].map((l) => 10 ** (l / 20));
		const crossing = (level: number): number => {
			const i = volts.findIndex((v) => v >= level);
			return (i - 1 + (level - volts[i - 1]) / (volts[i] - volts[i - 1])) * resolution;
		};
		return crossing(0.9) - crossing(0.1);
	};

	it('of the resolution filter is 0.67925/B', () => {
		expect(rise({ rbwHz: 30e3, vbwHz: 100e6 }, 1e-6) * 30e3).toBeCloseTo(0.67925, 2);
	});

	it('of the video filter is 0.34970/VBW', () => {
		expect(rise({ rbwHz: 3e6, vbwHz: 10e3 }, 1e-6) * 10e3).toBeCloseTo(0.3497, 2);
	});
});
