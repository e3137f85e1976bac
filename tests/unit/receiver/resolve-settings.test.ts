import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { settings as settingsSchema, type Settings } from '$lib/schemas/settings';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { BenchError } from '$lib/server/bench/bench-error';
import { field, modest } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';

const resolve = (typed: Settings, profile: ReceiverProfile = field) =>
	resolveSettings(settingsSchema.parse(typed), profile);
function refusal(typed: Settings, profile: ReceiverProfile = field): BenchError {
	try {
		resolve(typed, profile);
	} catch (error) {
		if (error instanceof BenchError) return error;
		throw error;
	}
	throw new Error('was not refused');
}
const here = { centreHz: 1e9, spanHz: 20e6 };

describe('resolveSettings: couplings', () => {
	it('takes the step nearest span/100 on a logarithmic scale as resolution bandwidth', () => {
		expect(resolve({ centreHz: 1e9, spanHz: 2e6 }).rbwHz).toBe(30e3);
		expect(resolve({ centreHz: 1e9, spanHz: 1.7e6 }).rbwHz).toBe(10e3);
		expect(resolve({ centreHz: 1e9, spanHz: 20 }).rbwHz).toBe(1);
		expect(resolve({}).rbwHz).toBe(3e6);
	});
	it('sets the video bandwidth to three resolution bandwidths', () =>
		expect(resolve({ ...here, rbwHz: 10e3 }).vbwHz).toBe(30e3));
	it('sweeps in 5·span/RBW² when the video filter is wide', () =>
		expect(resolve({ ...here, rbwHz: 10e3 }).sweepTimeS).toBeCloseTo(1, 12));
	it('sweeps in 5·span/(RBW·VBW) when the video filter is narrow', () =>
		expect(resolve({ ...here, rbwHz: 10e3, vbwHz: 1e3 }).sweepTimeS).toBeCloseTo(10, 12));
	it('never sweeps faster than 1 ms by itself', () =>
		expect(resolve({ ...here, rbwHz: 3e6 }).sweepTimeS).toBe(1e-3));
	it('keeps a hand-set sweep time below the automatic one, and says what automatic would be', () => {
		const fast = resolve({ ...here, rbwHz: 10e3, sweepTimeS: 0.02 });
		expect(fast.sweepTimeS).toBe(0.02);
		expect(fast.autoSweepTimeS).toBeCloseTo(1, 12);
	});
	it('takes the smallest attenuation that brings the reference level to −10 dBm at the mixer', () => {
		expect(resolve(here).attenuationDb).toBe(10);
		expect(resolve({ ...here, referenceDbm: 1 }).attenuationDb).toBe(15);
		expect(resolve({ ...here, referenceDbm: -10 }).attenuationDb).toBe(0);
		expect(resolve({ ...here, referenceDbm: -30, preamp: true }).attenuationDb).toBe(0);
		expect(resolve({ ...here, preamp: true }).attenuationDb).toBe(30);
	});
	it('takes the correction at the centre off the reference level first', () => {
		const correctionDb = [
			{ frequencyHz: 0.9e9, db: 2 },
			{ frequencyHz: 1.1e9, db: 6 }
		];
		expect(resolve({ ...here, correctionDb }).attenuationDb).toBe(10);
		expect(resolve({ ...here, correctionDb: 20 }).attenuationDb).toBe(0);
		expect(resolve({ ...here, referenceDbm: 4, correctionDb }).attenuationDb).toBe(10);
		expect(resolve({ ...here, referenceDbm: 4.1, correctionDb }).attenuationDb).toBe(15);
	});
	it('does not look at the pad, which the receiver cannot know of', () =>
		expect(resolve({ ...here, input: { padDb: 30 } }).attenuationDb).toBe(10));
	it('fills in every default', () =>
		expect(resolve({ traces: [{ mode: 'average', count: 7 }] })).toMatchObject({
			startHz: field.startHz,
			stopHz: field.stopHz,
			points: 1001,
			detector: 'rise-fall',
			scale: 'log',
			referenceDbm: 0,
			preamp: false,
			correctionDb: 0,
			input: { connected: true, padDb: 0, dcBlock: false },
			traces: [{ mode: 'average', count: 7 }],
			auto: { rbwHz: true, vbwHz: true, sweepTimeS: true, detector: true, attenuationDb: true }
		}));
	it('gives both frequency pairs whichever was typed', () => {
		expect(resolve({ startHz: 1e9, stopHz: 1.5e9 })).toMatchObject({ centreHz: 1.25e9, spanHz: 0.5e9 });
		expect(resolve({ centreHz: 1.25e9, spanHz: 0.5e9 })).toMatchObject({ startHz: 1e9, stopHz: 1.5e9 });
	});
	it('takes any positive video bandwidth to 1 GHz, 10 MHz over a 1 kHz filter among them', () =>
		expect(resolve({ ...here, rbwHz: 100e3, vbwHz: 10e6 }).vbwHz).toBe(10e6));
	it('shows level over time at span 0 with a stated resolution bandwidth', () =>
		expect(resolve({ centreHz: 1e9, spanHz: 0, rbwHz: 1e6, sweepTimeS: 0.5 })).toMatchObject({
			spanHz: 0,
			sweepTimeS: 0.5
		}));
	it('accepts again what it resolved, unchanged', () =>
		fc.assert(
			fc.property(
				fc.double({ min: 1e3, max: 3e9, noNaN: true }),
				fc.constantFrom(-30, 0, 10),
				(spanHz, referenceDbm) => {
					const once = resolve({ centreHz: 4e9, spanHz, referenceDbm });
					const { centreHz, rbwHz, vbwHz, sweepTimeS, attenuationDb, detector } = once;
					const again = resolve({
						centreHz,
						spanHz,
						rbwHz,
						vbwHz,
						sweepTimeS,
						attenuationDb,
						detector,
						referenceDbm
					});
					expect({ ...again, auto: once.auto }).toEqual(once);
				}
			)
		));
});

describe('resolveSettings: refusals name the entry, the limit and the value', () => {
	it.each<[string, Settings, string, RegExp]>([
		['both frequency pairs', { ...here, startHz: 1e9, stopHz: 2e9 }, 'startHz', /not centreHz with startHz/],
		['one of each pair', { centreHz: 1e9, stopHz: 2e9 }, 'stopHz', /not centreHz with stopHz/],
		['a centre without a span', { centreHz: 1e9 }, 'centreHz', /spanHz/],
		['a span without a centre', { spanHz: 1e6 }, 'spanHz', /centreHz/],
		['a start without a stop', { startHz: 1e9 }, 'startHz', /stopHz/],
		['a stop without a start', { stopHz: 1e9 }, 'stopHz', /startHz/],
		['a reversed pair', { startHz: 2e9, stopHz: 1e9 }, 'stopHz', /1000000000 Hz/],
		[
			'a start below the range',
			{ startHz: 1e3, stopHz: 1e9 },
			'startHz',
			/20000 to 8200000000 Hz; given 1000 Hz/
		],
		['a stop above the range', { startHz: 1e9, stopHz: 9e9 }, 'stopHz', /8200000000 Hz; given 9000000000/],
		[
			'a centre above the range',
			{ centreHz: 9e9, spanHz: 1e6 },
			'centreHz',
			/8200000000 Hz; given 9000000000/
		],
		['a span that leaves the range', { centreHz: 8.1999e9, spanHz: 1e6 }, 'spanHz', /8200400000/],
		['a bandwidth off the list', { ...here, rbwHz: 7e3 }, 'rbwHz', /1000, 3000, 10000.*given 7000 Hz/],
		['span 0 without a bandwidth', { centreHz: 1e9, spanHz: 0 }, 'rbwHz', /span 0/],
		['too wide a video bandwidth', { ...here, vbwHz: 2e9 }, 'vbwHz', /1000000000 Hz; given 2000000000/],
		['an automatic sweep beyond 2000 s', { ...here, rbwHz: 100 }, 'rbwHz', /rbwHz 100 .*10000 s.*2000 s/],
		['the same for a narrow video filter', { ...here, rbwHz: 1e4, vbwHz: 1 }, 'rbwHz', /vbwHz 1 .*2000 s/],
		['a hand-set sweep beyond 2000 s', { ...here, sweepTimeS: 2001 }, 'sweepTimeS', /2000 s; given 2001 s/],
		[
			'a hand-set sweep under 100 µs',
			{ ...here, sweepTimeS: 9e-5 },
			'sweepTimeS',
			/0.0001 .*given 0.00009 s/
		],
		['attenuation that is no step', { ...here, attenuationDb: 7 }, 'attenuationDb', /0, 5, 10.*given 7 dB/],
		['a reference no step can serve', { ...here, referenceDbm: 60 }, 'referenceDbm', /largest step is 50 dB/],
		['a correction no step can serve', { ...here, correctionDb: -60 }, 'correctionDb', /-60 dB/]
	])('%s', (_, typed, named, message) => {
		const error = refusal(typed);
		expect(error.field).toBe(named);
		expect(error.message).toMatch(message);
	});
	it('a preamplifier where there is none', () =>
		expect(refusal({ ...here, preamp: true }, modest)).toMatchObject({ field: 'preamp' }));
	it('2000 s exactly is allowed, however it came about', () => {
		expect(resolve({ ...here, rbwHz: 10e3, vbwHz: 5 }).sweepTimeS).toBeCloseTo(2000, 9);
		expect(resolve({ ...here, sweepTimeS: 2000 }).sweepTimeS).toBe(2000);
	});
});
