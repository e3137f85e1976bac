/**
 * Measures what a video filter between B/20 and 10 B leaves of the extremes of noise in long buckets, by the bench's own sampled sweep,
 * and writes src/lib/server/bench/receiver/smoothing-table.ts. Run with: npx tsx --tsconfig src/cli/tsconfig.json src/cli/smoothing-table.ts
 */
import { writeFileSync } from 'node:fs';
import type { Scale } from '$lib/schemas/settings';
import { meanOnScale } from '$lib/server/bench/receiver/average-laws';
import { GreatestOfNoise, leastOfNoise } from '$lib/server/bench/receiver/extreme-laws';
import { makeFrame, samplesPerBucket } from '$lib/server/bench/receiver/frame';
import type { Incident } from '$lib/server/bench/receiver/incident';
import { SteadyNoise } from '$lib/server/bench/receiver/noise-contribution';
import { Random } from '$lib/server/bench/receiver/random';
import { SampledSweep } from '$lib/server/bench/receiver/sampled-sweep';
import { powerOnScale } from '$lib/server/bench/receiver/video';
import type { ResolvedSettings } from '$lib/schemas/settings';

const RATIOS = [0.05, 0.1, 0.2, 0.5, 1, 2, 3, 5, 10];
/** Lengths of a bucket, in 1/B. */
const LENGTHS = [4, 16, 64];
const ROWS = 24;
const POINTS = 401;
const RBW = 1000;

function meanExtreme(
	scale: Scale,
	ratio: number,
	bt: number,
	detector: 'positive-peak' | 'negative-peak'
): number {
	const bucketS = bt / RBW;
	const settings = {
		points: POINTS,
		rbwHz: RBW,
		vbwHz: ratio * RBW,
		sweepTimeS: bucketS * (POINTS - 1),
		startHz: 1e6,
		spanHz: 0
	};
	const frame = makeFrame(settings as ResolvedSettings, 0, samplesPerBucket(RBW, bucketS, true));
	const noise: Incident['noises'][number] = { variance: () => 1 };
	const sweep = new SampledSweep(frame, detector, scale, [new SteadyNoise(noise, frame, 'noise')]);
	const out = new Float64Array(POINTS);
	let sum = 0;
	for (let n = 0; n < ROWS; n++) {
		sweep.row({ clockS: 0, random: (stream) => new Random('smoothing', n, stream) }, out);
		sum += out.reduce((a, b) => a + b, 0);
	}
	return sum / ROWS / POINTS;
}

/** Mean extreme on the scale that the law of unfiltered noise gives over a bucket. */
function lawExtreme(scale: Scale, bt: number, detector: 'positive-peak' | 'negative-peak'): number {
	const law = new GreatestOfNoise();
	const draws = 20_000;
	let sum = 0;
	for (let i = 0; i < draws; i++) {
		const exponential = -Math.log((i + 0.5) / draws);
		const power = detector === 'positive-peak' ? law.draw(exponential, bt) : leastOfNoise(exponential, bt);
		sum += powerOnScale(power, scale);
	}
	return sum / draws;
}

const table = Object.fromEntries(
	(['log', 'power', 'voltage'] as const).map((scale) => {
		const mean = meanOnScale(1, 0, scale);
		const shares = (detector: 'positive-peak' | 'negative-peak') =>
			RATIOS.map((r) =>
				[
					Math.log10(r),
					...LENGTHS.map(
						(bt) => (meanExtreme(scale, r, bt, detector) - mean) / (lawExtreme(scale, bt, detector) - mean)
					)
				].map((x) => +x.toFixed(4))
			);
		return [scale, { greatest: shares('positive-peak'), least: shares('negative-peak') }];
	})
);
const rows = (list: number[][]) => `[\n${list.map((p) => `\t\t\t[${p.join(', ')}]`).join(',\n')}\n\t\t]`;
const body = Object.entries(table)
	.map(([scale, t]) => `\t${scale}: {\n\t\tgreatest: ${rows(t.greatest)},\n\t\tleast: ${rows(t.least)}\n\t}`)
	.join(',\n');
writeFileSync(
	'src/lib/server/bench/receiver/smoothing-table.ts',
	`/**
 * Made by src/cli/smoothing-table.ts: log₁₀(VBW/B), then, for buckets of ${LENGTHS.join(', ')} (in 1/B), the filtered extreme's distance
 * from the mean as a share of the unfiltered law's.
 */
import type { Scale } from '$lib/schemas/settings';

export const SMOOTHING_LENGTHS = [${LENGTHS.join(', ')}] as const;
export type SmoothingRow = readonly [number, number, number, number];
export const SMOOTHING_TABLE: Record<Scale, { greatest: readonly SmoothingRow[]; least: readonly SmoothingRow[] }> = {\n${body}\n};\n`
);
