/**
 * `npm run bench:speed`: how fast rows are made on one core, for named scenes: preparing, then median and 95th percentile per row,
 * with the time to draw as many normal pairs as the row has independent noise values beside it, since machines differ.
 */
import { cpus } from 'node:os';
import type { Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { field } from '$lib/server/bench/receiver/profiles';
import { Random } from '$lib/server/bench/receiver/random';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import { speedScenes } from './speed-scenes';

const WARM_UP_S = 0.4;
const MEASURE_S = 1.2;
const PREPARES = 20;

const quantile = (sorted: number[], q: number): number =>
	sorted[Math.min(sorted.length - 1, Math.floor(q * sorted.length))];
const rising = (values: number[]): number[] => [...values].sort((a, b) => a - b);

function timePrepare(scene: Scene, settings: Settings): number[] {
	const times: number[] = [];
	for (let i = 0; i < PREPARES; i++) {
		const moved: Settings =
			settings.centreHz === undefined ? settings : { ...settings, centreHz: settings.centreHz + i * 1009 };
		const start = performance.now();
		prepareSweep(scene, field, resolveSettings(moved, field), `prepare ${i}`).row(0, 0);
		times.push(performance.now() - start);
	}
	return rising(times);
}

function timeRows(scene: Scene, settings: Settings): { rows: number[]; pairsMs: number } {
	const resolved = resolveSettings(settings, field);
	const plan = prepareSweep(scene, field, resolved, 'speed');
	let n = 0;
	let clockS = 0;
	const next = () => {
		plan.row(n, clockS);
		clockS += plan.durationS(n++);
	};
	for (const until = performance.now() + WARM_UP_S * 1e3; performance.now() < until;) next();
	const rows: number[] = [];
	for (const until = performance.now() + MEASURE_S * 1e3; performance.now() < until || rows.length < 5;) {
		const start = performance.now();
		next();
		rows.push(performance.now() - start);
	}
	const bt = (resolved.rbwHz * resolved.sweepTimeS * resolved.points) / (resolved.points - 1);
	return { rows: rising(rows), pairsMs: timePairs(Math.ceil(3.4 * Math.min(bt, 4 * resolved.points))) };
}

/** Time to draw `count` pairs of normals, ms. */
function timePairs(count: number): number {
	const target = new Float64Array(2 * count);
	const times: number[] = [];
	for (let i = 0; i < 40; i++) {
		const random = new Random('pairs', i, 'speed');
		const start = performance.now();
		random.fillNormals(target, 2 * count);
		times.push(performance.now() - start);
	}
	return quantile(rising(times), 0.5);
}

const cell = (value: number): string => value.toFixed(value < 10 ? 2 : 1).padStart(7);

console.log(
	`${cpus()[0].model}, Node.js ${process.version}, ${new Date().toISOString().slice(0, 10)}; one core, ms`
);
console.log(`${'scene'.padEnd(46)} prepare: median   p95   row: median   p95  rows/s   pairs alone`);
for (const { name, scene, settings } of speedScenes) {
	const { rows, pairsMs } = timeRows(scene, settings);
	const prepares = timePrepare(scene, settings);
	const median = quantile(rows, 0.5);
	console.log(
		`${name.padEnd(46)}         ${cell(quantile(prepares, 0.5))}${cell(quantile(prepares, 0.95))}      ${cell(median)}${cell(
			quantile(rows, 0.95)
		)} ${(1e3 / median).toFixed(0).padStart(7)}     ${cell(pairsMs)}`
	);
}
