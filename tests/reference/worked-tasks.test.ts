/**
 * Worked end-to-end tasks W1, W3, W4, W7, W8 through sweep → reading on the model analyser (NF 24 dB, Gaussian RBW, TOI +15 and SHI +45 dBm).
 * Sources: W1 thermal noise and log-average bias (computed); W3 sidebands 20·lg(m/2) and W4 Bessel lines (A&S 1964, computed with mpmath);
 * W7, W8 intermodulation laws (Pozar, Microwave Engineering, 4th ed. §10.3–10.4: title and contents read; algebra computed).
 */
import { describe, expect, it } from 'vitest';
import type { Emitter } from '$lib/schemas/scene';
import { meanOf, modelAnalyser, read, sweep } from './bench-on-paper';

describe('W1: noise, input terminated, RBW 10 kHz, 10 dB attenuation, VBW 100 Hz', () => {
	const terminated = {
		receiver: modelAnalyser,
		settings: {
			startHz: 900e6,
			stopHz: 910e6,
			rbwHz: 10e3,
			vbwHz: 100,
			attenuationDb: 10,
			detector: 'sample' as const,
			input: { connected: false }
		}
	};
	it('the trace stands at −102.211 dBm, log-averaged', () => {
		expect(Math.abs(meanOf(sweep(terminated).levelsDbm[0]) + 102.211)).toBeLessThan(0.15);
	});
	it('the noise marker reads −139.975 dBm/Hz', () => {
		const marks = [902e6, 904e6, 906e6, 908e6].map(
			(atHz) => read(terminated, { kind: 'noise-density', atHz }).value
		);
		expect(Math.abs(meanOf(marks) + 139.975)).toBeLessThan(0.15);
	});
	it('averaged as power it stands at −99.704 dBm', () => {
		const power = {
			...terminated,
			settings: {
				...terminated.settings,
				vbwHz: 10e6,
				scale: 'power' as const,
				detector: 'average' as const,
				sweepTimeS: 10
			}
		};
		const levels = sweep(power).levelsDbm[0];
		expect(Math.abs(10 * Math.log10(meanOf(levels.map((l) => 10 ** (l / 10)))) + 99.704)).toBeLessThan(0.15);
	});
});

describe('W3: AM, 100 MHz, −20 dBm, 10 kHz tone, 30 %, RBW 1 kHz', () => {
	const emitters: Emitter[] = [
		{ kind: 'am', frequencyHz: 100e6, levelDbm: -20, modulatingHz: 10e3, depth: 0.3 }
	];
	const settings = {
		centreHz: 100e6,
		spanHz: 60e3,
		rbwHz: 1e3,
		vbwHz: 10e6,
		sweepTimeS: 2,
		detector: 'positive-peak' as const,
		attenuationDb: 20
	};
	const on = { receiver: { ...modelAnalyser, toiDbm: null, shiDbm: null }, emitters, settings };
	it('carrier −20.000 dBm, sidebands −36.478 dBm at ±10 kHz', () => {
		expect(Math.abs(read(on, { kind: 'marker', atHz: 100e6 }).value + 20)).toBeLessThan(0.05);
		for (const atHz of [99.99e6, 100.01e6])
			expect(Math.abs(read(on, { kind: 'marker', atHz }).value + 36.478)).toBeLessThan(0.05);
	});
	it('depth 30.0 %', () => expect(read(on, { kind: 'am-depth', carrierHz: 100e6 }).value).toBeCloseTo(30, 0));
	it('channel power −19.809 dBm', () => {
		const power = { ...on, settings: { ...settings, detector: 'average' as const, scale: 'power' as const } };
		const { value } = read(power, { kind: 'channel-power', centreHz: 100e6, widthHz: 40e3 });
		expect(Math.abs(value + 19.809)).toBeLessThan(0.05);
	});
});

describe('W4: FM, 0 dBm, 10 kHz tone, 20 kHz deviation, RBW 300 Hz', () => {
	const fm = (deviationHz: number): Emitter[] => [
		{ kind: 'fm', frequencyHz: 100e6, levelDbm: 0, modulatingHz: 10e3, deviationHz }
	];
	const settings = {
		centreHz: 100e6,
		spanHz: 100e3,
		rbwHz: 300,
		vbwHz: 10e6,
		sweepTimeS: 20,
		points: 4001,
		detector: 'positive-peak' as const,
		referenceDbm: 10,
		attenuationDb: 30
	};
	const receiver = { ...modelAnalyser, toiDbm: null, shiDbm: null };
	it.each([
		[0, -12.999],
		[1, -4.781],
		[2, -9.049],
		[3, -17.792],
		[4, -29.372]
	])('line %d stands at %d dBm on both sides', (n, levelDbm) => {
		for (const side of [-1, 1]) {
			const { value } = read(
				{ receiver, emitters: fm(20e3), settings },
				{ kind: 'marker', atHz: 100e6 + side * n * 10e3 }
			);
			expect(Math.abs(value - levelDbm)).toBeLessThan(0.05);
		}
	});
	it('retuned to 24.048 kHz deviation the carrier is null: more than 50 dB under the unmodulated carrier', () => {
		expect(
			read({ receiver, emitters: fm(24048.256), settings }, { kind: 'marker', atHz: 100e6 }).value
		).toBeLessThan(-50);
	});
});

describe('W7: two tones of −20 dBm at 100 and 101 MHz; each product in 2 kHz, log average of 100', () => {
	const emitters: Emitter[] = [100e6, 101e6].map((frequencyHz) => ({
		kind: 'cw',
		frequencyHz,
		levelDbm: -20
	}));
	const product = (centreHz: number, attenuationDb: number) =>
		read(
			{
				receiver: modelAnalyser,
				emitters,
				settings: {
					centreHz,
					spanHz: 2e3,
					rbwHz: 100,
					attenuationDb,
					traces: [{ mode: 'average', count: 100 }]
				},
				sweeps: 100
			},
			{ kind: 'peak' }
		).value;
	it.each([99e6, 102e6])('without attenuation the product at %d Hz stands at −90.0 dBm', (centreHz) => {
		expect(Math.abs(product(centreHz, 0) + 90)).toBeLessThan(0.2);
	});
	it('behind 10 dB it falls to −110.0 dBm: it was the receiver’s own', () => {
		expect(Math.abs(product(99e6, 10) + 110)).toBeLessThan(0.35); // 12 dB over a floor of −122.2 dBm: noise adds 0.27 dB on a power scale
	});
});

describe('W8: −10 dBm at 50 MHz, clean', () => {
	const emitters: Emitter[] = [{ kind: 'cw', frequencyHz: 50e6, levelDbm: -10 }];
	it.each([
		[0, -65],
		[10, -75]
	])('behind %d dB of attenuation the second harmonic stands at %d dBm', (attenuationDb, levelDbm) => {
		const settings = {
			centreHz: 100e6,
			spanHz: 20e3,
			rbwHz: 300,
			attenuationDb,
			detector: 'positive-peak' as const
		};
		const { value } = read({ receiver: modelAnalyser, emitters, settings }, { kind: 'peak' });
		expect(Math.abs(value - levelDbm)).toBeLessThan(0.1);
	});
});
