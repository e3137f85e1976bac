import { describe, expect, it } from 'vitest';
import { buildLines, buildNoise, buildTrace } from '../../factories/trace';
import { codesOf, problemOf, readOff } from '../../factories/reading';

const setup = { startHz: 80e6, stopHz: 120e6, rbwHz: 100e3, points: 2001, scale: 'power' } as const;
const request = {
	kind: 'adjacent-channel',
	centreHz: 100e6,
	widthHz: 4e6,
	offsets: [
		{ offsetHz: 5e6, widthHz: 4e6 },
		{ offsetHz: 10e6, widthHz: 4e6 }
	]
} as const;
const asked = { ...request, offsets: [...request.offsets] };
const trace = buildLines(
	setup,
	[
		{ frequencyHz: 100e6, levelDbm: -10 },
		{ frequencyHz: 95e6, levelDbm: -55 },
		{ frequencyHz: 105e6, levelDbm: -50 },
		{ frequencyHz: 110e6, levelDbm: -70 }
	],
	-140
);

describe('adjacent-channel {centreHz, widthHz, offsets, rrcRollOff?}', () => {
	it('reads each channel on both sides against one’s own; the value is the worst', () => {
		const { value, unit, parts } = readOff(trace, asked);
		expect(value).toBeCloseTo(-40, 2);
		expect(unit).toBe('dBc');
		expect(parts!.map(({ offsetHz, side }) => [offsetHz, side])).toEqual([
			[5e6, 'lower'],
			[5e6, 'upper'],
			[10e6, 'lower'],
			[10e6, 'upper']
		]);
		expect(parts!.map(({ dbc }) => Math.round(10 * dbc) / 10).slice(0, 2)).toEqual([-45, -40]);
		expect(parts![3].levelDbm).toBeCloseTo(-70, 1);
	});
	it('leaves out channels beyond the trace, and says so', () => {
		const far = { ...asked, offsets: [...request.offsets, { offsetHz: 40e6, widthHz: 4e6 }] };
		const reading = readOff(trace, far);
		expect(reading.parts).toHaveLength(4);
		expect(codesOf(reading)).toContain('window-outside-span');
		expect(problemOf(trace, { ...asked, offsets: [far.offsets[2]] }).problem).toContain(
			'None of the neighbouring'
		);
	});
	it('weights with a root-raised-cosine filter: white noise has bandwidth widthHz, a line at half that loses 3 dB', () => {
		const flat = buildTrace(setup, () => -80);
		const plain = readOff(flat, asked).parts![0].levelDbm;
		const weighted = readOff(flat, { ...asked, rrcRollOff: 0.22 }).parts![0].levelDbm;
		expect(weighted).toBeCloseTo(plain, 6);
		const edge = buildLines(
			setup,
			[
				{ frequencyHz: 100e6, levelDbm: -10 },
				{ frequencyHz: 107e6, levelDbm: -40 }
			],
			-160
		);
		const [, upper] = readOff(edge, { ...asked, rrcRollOff: 0.22 }).parts!;
		expect(upper.dbc).toBeCloseTo(-33.01, 1);
	});
	it('remarks on noise shown by a peak detector', () => {
		const noise = buildNoise('peaked', { ...setup, detector: 'positive-peak' }, -140);
		expect(codesOf(readOff(noise, asked))).toContain('detector-peak-on-noise');
	});
});
