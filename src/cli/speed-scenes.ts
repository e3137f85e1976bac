/** Scenes and set-ups whose speed is watched: what learners use all day, and the hardest settings that are allowed. */
import type { Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';

/** Three densities and six lines about 1 GHz. */
const load: Scene = {
	emitters: [
		{ kind: 'digital', frequencyHz: 0.9985e9, levelDbm: -31, symbolRateHz: 1.2e6, rollOff: 0.22, order: 4 },
		{ kind: 'multicarrier', frequencyHz: 1.0042e9, levelDbm: -37, subcarriers: 64, spacingHz: 15e3 },
		{ kind: 'noise', densityDbmPerHz: -132, startHz: 0.9921e9, stopHz: 0.9958e9 },
		{ kind: 'cw', frequencyHz: 0.9934e9, levelDbm: -48 },
		{ kind: 'cw', frequencyHz: 0.9972e9, levelDbm: -54 },
		{ kind: 'cw', frequencyHz: 1.0003e9, levelDbm: -44 },
		{ kind: 'cw', frequencyHz: 1.0021e9, levelDbm: -61 },
		{ kind: 'cw', frequencyHz: 1.0066e9, levelDbm: -52 },
		{ kind: 'cw', frequencyHz: 1.0083e9, levelDbm: -69 }
	]
};
const at: Settings = { centreHz: 1e9, spanHz: 20e6, detector: 'average', scale: 'log' };
const one = (emitter: Scene['emitters'][number]): Scene => ({ emitters: [emitter] });
const qpsk = one({
	kind: 'digital',
	frequencyHz: 1e9,
	levelDbm: -30,
	symbolRateHz: 1e6,
	rollOff: 0.35,
	order: 4
});

export const speedScenes: { name: string; scene: Scene; settings: Settings }[] = [
	{ name: 'load', scene: load, settings: at },
	{ name: 'load, 51 MHz (worst ratio)', scene: load, settings: { ...at, spanHz: 51e6 } },
	{ name: 'load, positive-peak', scene: load, settings: { ...at, detector: 'positive-peak' } },
	{ name: 'load, rise-fall', scene: load, settings: { ...at, detector: 'rise-fall' } },
	{ name: 'load, negative-peak', scene: load, settings: { ...at, detector: 'negative-peak' } },
	{
		name: 'load, 51 MHz, positive-peak',
		scene: load,
		settings: { ...at, spanHz: 51e6, detector: 'positive-peak' }
	},
	{ name: 'load, 10001 points', scene: load, settings: { ...at, points: 10001 } },
	{
		name: 'load, 10001 points, positive-peak',
		scene: load,
		settings: { ...at, points: 10001, detector: 'positive-peak' }
	},
	{ name: 'load, video B/10', scene: load, settings: { ...at, vbwHz: 20e3 } },
	{ name: 'load, video B/100', scene: load, settings: { ...at, vbwHz: 2e3 } },
	{
		name: 'load, video B/100, positive-peak',
		scene: load,
		settings: { ...at, vbwHz: 2e3, detector: 'positive-peak' }
	},
	{
		name: 'load, long buckets (16/B), average',
		scene: load,
		settings: { ...at, rbwHz: 100e3, sweepTimeS: 0.16 }
	},
	{
		name: 'load, long buckets (16/B), positive-peak',
		scene: load,
		settings: { ...at, rbwHz: 100e3, sweepTimeS: 0.16, detector: 'positive-peak' }
	},
	{
		name: 'load, long buckets (1000/B), positive-peak',
		scene: load,
		settings: { ...at, rbwHz: 100e3, sweepTimeS: 10, detector: 'positive-peak' }
	},
	{ name: 'QPSK envelope swept', scene: qpsk, settings: { ...at, spanHz: 10e6, rbwHz: 300e3 } },
	{
		name: 'QPSK envelope, span 0',
		scene: qpsk,
		settings: { ...at, spanHz: 0, rbwHz: 1e6, sweepTimeS: 0.001 }
	},
	{
		name: 'QPSK envelope, span 0, 1 s',
		scene: qpsk,
		settings: { ...at, spanHz: 0, rbwHz: 1e6, sweepTimeS: 1, detector: 'positive-peak' }
	},
	{
		name: 'GMSK, span 0, 1001 points of 1.5/B',
		scene: one({ kind: 'msk', frequencyHz: 1e9, levelDbm: -30, bitRateHz: 270e3, bt: 0.3 }),
		settings: { ...at, spanHz: 0, rbwHz: 300e3, sweepTimeS: 0.005 }
	},
	{
		name: 'FM, 137 lines',
		scene: one({ kind: 'fm', frequencyHz: 1e9, levelDbm: -20, modulatingHz: 1e3, deviationHz: 60e3 }),
		settings: { ...at, spanHz: 200e3, rbwHz: 300 }
	},
	{
		name: 'gated carrier beside pulses',
		scene: {
			emitters: [
				{ kind: 'cw', frequencyHz: 0.999e9, levelDbm: -30, gate: { onS: 1e-3, offS: 3e-3 } },
				{ kind: 'pulsed', frequencyHz: 1.002e9, levelDbm: -20, widthS: 2e-6, periodS: 50e-6 }
			]
		},
		settings: { ...at, rbwHz: 300e3, detector: 'positive-peak' }
	},
	{
		name: 'radar, 1 s sweep, positive-peak',
		scene: one({ kind: 'pulsed', frequencyHz: 1e9, levelDbm: -20, widthS: 1e-6, periodS: 1e-3 }),
		settings: { ...at, rbwHz: 100e3, sweepTimeS: 1, detector: 'positive-peak' }
	},
	{
		name: 'hopper, 2 s sweep, positive-peak',
		scene: one({
			kind: 'cw',
			frequencyHz: 1e9,
			levelDbm: -40,
			hop: { channelsHz: [0.995e9, 0.999e9, 1.001e9, 1.004e9], dwellS: 0.01 }
		}),
		settings: { ...at, rbwHz: 100e3, sweepTimeS: 2, detector: 'positive-peak' }
	}
];
