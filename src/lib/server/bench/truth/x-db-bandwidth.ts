import { dbToPowerRatio } from '$lib/units/decibel';
import { BenchError } from '../bench-error';
import { frequencyAtShare } from '../signal/regrowth-clusters';
import type { PulseComb } from './pulse-comb';
import { densityAt, type Spectrum, type SpectrumLine } from './spectrum';
import type { TruthOf } from './truth-kind';

/**
 * Width between the outermost points x dB under the highest: of the lines if there are any, else of the power density. Hz.
 */
export const xDbBandwidth: TruthOf<'x-db-bandwidth'> = ({ spectrum }, { db }) => {
	const [lowerHz, upperHz] = hasLines(spectrum())
		? outermostLines(spectrum(), db)
		: crossings(spectrum(), db);
	return { value: upperHz - lowerHz, unit: 'Hz', parts: { lowerHz, upperHz } };
};

const hasLines = ({ lines, combs }: Spectrum): boolean => lines.length + combs.length > 0;

function outermostLines({ lines, combs }: Spectrum, db: number): [number, number] {
	const all = [...lines, ...combs.map((comb) => comb.line(0))];
	const top = all.reduce((highest, line) => Math.max(highest, line.levelMw), 0);
	// A line exactly x dB down counts: rounding must not decide.
	const least = top * dbToPowerRatio(-db) * (1 - 1e-9);
	const within = [
		...lines.filter((line) => line.levelMw >= least),
		...combs.flatMap((comb) => outermostOf(comb, db, least))
	].map((line) => line.frequencyHz);
	const lowerHz = within.reduce((a, b) => Math.min(a, b));
	const upperHz = within.reduce((a, b) => Math.max(a, b));
	if (lowerHz === upperHz)
		throw new BenchError('db', `db: no second line is within ${db} dB of the strongest: there is no width`);
	return [lowerHz, upperHz];
}

function outermostOf(comb: PulseComb, db: number, leastMw: number): SpectrumLine[] {
	for (let n = comb.reach(db); n >= 0; n--)
		if (comb.line(n).levelMw >= leastMw) return [comb.line(-n), comb.line(n)];
	return [];
}

/** Points in one look across the spectrum. */
const LOOK = 16384;

function crossings(spectrum: Spectrum, db: number): [number, number] {
	const { densities } = spectrum;
	if (densities.length === 0) throw new BenchError('kind', 'kind: the scene has no power');
	const density = (frequencyHz: number) => densityAt(spectrum, frequencyHz);
	const least = Math.min(...densities.map((d) => d.startHz));
	const most = Math.max(...densities.map((d) => d.stopHz));
	// Begin where nearly all of the power is; widen while the density beyond is still high enough.
	let startHz = Math.min(...densities.map((d) => frequencyAtShare(d, 5e-5)));
	let stopHz = Math.max(...densities.map((d) => frequencyAtShare(d, 1 - 5e-5)));
	const limit = highest(density, startHz, stopHz) * dbToPowerRatio(-db);
	for (;;) {
		const width = stopHz - startHz;
		const from = Math.max(least, startHz - width / 2);
		const to = Math.min(most, stopHz + width / 2);
		const grown = from < startHz || to > stopHz;
		if (!grown || !(reaches(density, limit, from, startHz) || reaches(density, limit, stopHz, to))) break;
		[startHz, stopHz] = [from, to];
	}
	const step = (stopHz - startHz) / LOOK;
	let first = 0;
	while (first <= LOOK && density(startHz + first * step) < limit) first++;
	let last = LOOK;
	while (density(startHz + last * step) < limit) last--;
	return [
		crossing(density, limit, startHz + (first - 1) * step, startHz + first * step),
		crossing(density, limit, startHz + (last + 1) * step, startHz + last * step)
	];
}

function reaches(density: (frequencyHz: number) => number, limit: number, from: number, to: number): boolean {
	const step = (to - from) / LOOK;
	for (let i = 1; i < LOOK; i++) if (density(from + i * step) >= limit) return true;
	return false;
}

/** The highest value: the best of a look across, then golden sections around it. */
function highest(density: (frequencyHz: number) => number, startHz: number, stopHz: number): number {
	const step = (stopHz - startHz) / LOOK;
	let best = 0;
	for (let i = 1; i <= LOOK; i++) if (density(startHz + i * step) > density(startHz + best * step)) best = i;
	let low = startHz + (best - 1) * step;
	let high = startHz + (best + 1) * step;
	const golden = (Math.sqrt(5) - 1) / 2;
	for (let i = 0; i < 60; i++) {
		const a = high - golden * (high - low);
		const b = low + golden * (high - low);
		if (density(a) > density(b)) high = b;
		else low = a;
	}
	return Math.max(density((low + high) / 2), density(startHz + best * step));
}

/** Where the density passes `limit` between a point below it and a point above. */
function crossing(
	density: (frequencyHz: number) => number,
	limit: number,
	belowHz: number,
	aboveHz: number
): number {
	let [low, high] = [belowHz, aboveHz];
	for (let i = 0; i < 100; i++) {
		const middle = (low + high) / 2;
		if (density(middle) < limit) low = middle;
		else high = middle;
	}
	return (low + high) / 2;
}
