/** A set-up as the receiver resolves it, for tests of what stands on the page. */
import type { ResolvedSettings } from '$lib/schemas/settings';

export const resolved: ResolvedSettings = {
	...{ startHz: 449e6, stopHz: 451e6, centreHz: 450e6, spanHz: 2e6, points: 1001 },
	...{ rbwHz: 30e3, vbwHz: 90e3, sweepTimeS: 0.0111, autoSweepTimeS: 0.0111 },
	...{
		detector: 'rise-fall',
		scale: 'log',
		referenceDbm: 0,
		attenuationDb: 10,
		preamp: false,
		correctionDb: 0
	},
	input: { connected: true, padDb: 0, dcBlock: false },
	traces: [{ mode: 'live', count: 100 }],
	auto: { rbwHz: true, vbwHz: true, sweepTimeS: true, detector: true, attenuationDb: true }
};
