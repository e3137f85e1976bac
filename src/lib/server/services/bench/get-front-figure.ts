import type { FrontFigure } from '$lib/schemas/front-figure';
import type { Scene } from '$lib/schemas/scene';
import { field } from '$lib/server/bench/receiver/profiles';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';

const CENTRE_HZ = 450.025e6;
const SPAN_HZ = 120e3;
const REFERENCE_DBM = -20;
const SEED = 'front page';

/** Two telemetry carriers on neighbouring channels, and a third 30 dB under the first. */
const OFFSETS_HZ = [-6.25e3, 6.25e3, 31.25e3];
const SCENE: Scene = {
	emitters: [-32, -39, -62].map((levelDbm, i) => ({
		kind: 'cw',
		frequencyHz: CENTRE_HZ + OFFSETS_HZ[i],
		levelDbm
	}))
};

let figure: FrontFigure | undefined;

/** Two sweeps of the bench's own receiver over the same scene. Always the same, so they are made once a process. */
export const getFrontFigure = (): FrontFigure =>
	(figure ??= {
		centreHz: CENTRE_HZ,
		spanHz: SPAN_HZ,
		referenceDbm: REFERENCE_DBM,
		carriersHz: [OFFSETS_HZ[0], OFFSETS_HZ[1]],
		sweeps: [10e3, 1e3].map((rbwHz) => ({ rbwHz, levelsDbm: sweepThrough(rbwHz) }))
	});

function sweepThrough(rbwHz: number): number[] {
	const settings = { centreHz: CENTRE_HZ, spanHz: SPAN_HZ, rbwHz, vbwHz: rbwHz / 3, points: 801 };
	const resolved = resolveSettings({ ...settings, referenceDbm: REFERENCE_DBM, detector: 'sample' }, field);
	const row = prepareSweep(SCENE, field, resolved, SEED).row(0, 0);
	// A tenth of a decibel is a quarter of a pixel here.
	return Array.from(row, (levelDbm) => Math.round(levelDbm * 10) / 10);
}
