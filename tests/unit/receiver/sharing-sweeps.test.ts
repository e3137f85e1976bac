import { describe, expect, it } from 'vitest';
import type { Settings } from '$lib/schemas/settings';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { sharingSweeps } from '$lib/server/bench/receiver/sharing-sweeps';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import { scene as sceneSchema } from '$lib/schemas/scene';

const scene = sceneSchema.parse({
	emitters: [
		{ kind: 'cw', frequencyHz: 450e6, levelDbm: -30 },
		{
			kind: 'digital',
			frequencyHz: 450.2e6,
			levelDbm: -40,
			order: 4,
			symbolRateHz: 20e3,
			rollOff: 0.35,
			gate: { onS: 0.01, offS: 0.02 }
		}
	]
});
const base: Settings = { centreHz: 450.1e6, spanHz: 500e3, rbwHz: 10e3, points: 201 };
const changes: Settings[] = [
	{},
	{ correctionDb: 3.2 },
	{ correctionDb: -3.2, referenceDbm: -20 },
	{ detector: 'average', scale: 'power' },
	{ detector: 'average', scale: 'log' },
	{ detector: 'positive-peak' },
	{ vbwHz: 1e3 },
	{ attenuationDb: 40 },
	{ sweepTimeS: 2 },
	{ sweepTimeS: 2, detector: 'average', scale: 'power', correctionDb: 1 },
	{ input: { connected: false } },
	{}
];

describe('sharingSweeps(scene, profile, seed)', () => {
	it('makes the rows that each set-up makes by itself, to the last digit', () => {
		const share = sharingSweeps(scene, field, 11);
		for (const change of changes) {
			const resolved = resolveSettings({ ...base, ...change }, field);
			const shared = share(resolved);
			const alone = prepareSweep(scene, field, resolved, 11);
			expect(shared.flags).toEqual(alone.flags);
			for (const [n, clockS] of [
				[0, 0],
				[1, 0.37],
				[0, 0]
			]) {
				expect(shared.row(n, clockS)).toEqual(alone.row(n, clockS));
				expect(shared.durationS(n)).toBe(alone.durationS(n));
			}
		}
	});
});
