/** The exact spectrum at the reference plane: lines, densities, and the power between any two frequencies. */
import type { Device } from '$lib/schemas/scene';
import type { Density, Line } from '../signal/emitter-kind';
import { kindOf } from '../signal/kinds';
import { distort } from '../signal/nonlinearity';
import { integratedPhaseNoise, phaseNoiseDensity } from '../signal/phase-noise';
import { scaleDensity } from '../signal/scale-density';
import { integrate } from './integrate';
import type { PlacedEmitter } from './place-emitters';
import { combLines, pulseComb, type PulseComb } from './pulse-comb';

export interface SpectrumLine {
	frequencyHz: number;
	/** In the line itself. */
	powerMw: number;
	/** With the phase-noise skirts that belong to it: what a marker on it means. */
	levelMw: number;
}

export interface Spectrum {
	/** Frequencies rising. */
	lines: SpectrumLine[];
	/** Pulse trains, where no device has made other lines of them. */
	combs: PulseComb[];
	densities: Density[];
}

/** A share of a density's power below which its distribution is too coarse a difference, and the density is integrated. */
const SMALL_SHARE = 1e-8;

const powerOf = (line: Line): number => line.re * line.re + line.im * line.im;

/** What the emitters put on the reference plane, through the device if there is one. Phases as at t = 0, all zero. */
export function spectrumOf(emitters: PlacedEmitter[], device?: Device): Spectrum {
	const lines: Line[] = [];
	const keeps: number[] = [];
	const skirts: { line: number; density: Density }[] = [];
	const densities: Density[] = [];
	const combs: PulseComb[] = [];
	for (const { emitter, index } of emitters) {
		const kind = kindOf(emitter);
		if (kind.density) {
			densities.push(kind.density(emitter));
			continue;
		}
		if (emitter.kind === 'pulsed' && !device) {
			combs.push(pulseComb(emitter));
			continue;
		}
		const own = kind.lines?.(emitter, { carrierRad: 0, modulationRad: 0 }) ?? [];
		let share = 1;
		if (emitter.kind === 'cw' && emitter.phaseNoise) {
			const { frequencyHz, phaseNoise } = emitter;
			share = Math.exp(-integratedPhaseNoise(phaseNoise, `scene.emitters.${index}.phaseNoise`));
			const density = phaseNoiseDensity(frequencyHz, kind.meanPowerMw(emitter), phaseNoise);
			skirts.push({ line: lines.length, density });
		}
		for (const line of own) {
			lines.push(line);
			keeps.push(share);
		}
	}
	const out = device ? distort(lines, densities, device) : { lines, densities };
	// A skirt is its carrier's phase: the device does to it what it does to the carrier.
	const carried = skirts.map(({ line, density }) =>
		scaleDensity(density, powerOf(out.lines[line]) / powerOf(lines[line]))
	);
	return {
		lines: out.lines
			.map((line, i) => ({
				frequencyHz: line.frequencyHz,
				powerMw: powerOf(line),
				levelMw: powerOf(line) / (keeps[i] ?? 1)
			}))
			.sort((a, b) => a.frequencyHz - b.frequencyHz),
		combs,
		densities: [...out.densities, ...carried]
	};
}

/** Power from `startHz` to `stopHz`, lines on either edge included, mW. To 1e-6 of itself. */
export function powerBetween(spectrum: Spectrum, startHz: number, stopHz: number): number {
	let sum = 0;
	for (const line of spectrum.lines)
		if (line.frequencyHz >= startHz && line.frequencyHz <= stopHz) sum += line.powerMw;
	for (const comb of spectrum.combs) sum += combBetween(comb, startHz, stopHz);
	for (const density of spectrum.densities) sum += densityBetween(density, startHz, stopHz);
	return sum;
}

function combBetween(comb: PulseComb, startHz: number, stopHz: number): number {
	const first = Math.ceil((startHz - comb.centreHz) / comb.spacingHz - 1e-9);
	return Math.max(0, comb.below(stopHz) - comb.below(comb.centreHz + (first - 0.5) * comb.spacingHz));
}

function densityBetween(density: Density, startHz: number, stopHz: number): number {
	const share = density.cumulative(stopHz) - density.cumulative(startHz);
	if (share > SMALL_SHARE) return share * density.powerMw;
	return integrate((f) => density.densityMwPerHz(f), startHz, stopHz, density.breaksHz);
}

/** Power from `startHz` to `stopHz` weighted by `weight`, which may bend at `breaksHz`; mW. */
export function weightedPowerBetween(
	spectrum: Spectrum,
	startHz: number,
	stopHz: number,
	weight: (frequencyHz: number) => number,
	breaksHz: number[]
): number {
	let sum = 0;
	for (const { frequencyHz, powerMw } of spectrum.lines)
		if (frequencyHz >= startHz && frequencyHz <= stopHz) sum += powerMw * weight(frequencyHz);
	for (const comb of spectrum.combs)
		for (const { frequencyHz, powerMw } of combLines(comb, startHz, stopHz))
			sum += powerMw * weight(frequencyHz);
	for (const density of spectrum.densities)
		sum += integrate((f) => weight(f) * density.densityMwPerHz(f), startHz, stopHz, [
			...density.breaksHz,
			...breaksHz
		]);
	return sum;
}

/** All of the power, mW. */
export const totalPower = (spectrum: Spectrum): number =>
	spectrum.lines.reduce((sum, line) => sum + line.powerMw, 0) +
	spectrum.combs.reduce((sum, comb) => sum + comb.totalMw, 0) +
	spectrum.densities.reduce((sum, density) => sum + density.powerMw, 0);

/** Power density of everything but lines at `frequencyHz`, mW/Hz. */
export const densityAt = (spectrum: Spectrum, frequencyHz: number): number =>
	spectrum.densities.reduce((sum, density) => sum + density.densityMwPerHz(frequencyHz), 0);

/** Lines closer than this are one, Hz. */
const SAME_HZ = 1e-3;
/** How far from a line a question may point: a millionth of the frequency, 1 Hz at least. */
const reachHz = (frequencyHz: number): number => Math.max(1, 1e-6 * frequencyHz);

/** The line at `frequencyHz` (`fartherHz` beyond the usual reach), with others on the same spot; null where there is none. */
export function lineAt(spectrum: Spectrum, frequencyHz: number, fartherHz = 0): SpectrumLine | null {
	const distance = (line: SpectrumLine) => Math.abs(line.frequencyHz - frequencyHz);
	const candidates = [
		...spectrum.lines,
		...spectrum.combs.map((comb) => comb.line(Math.round((frequencyHz - comb.centreHz) / comb.spacingHz)))
	];
	const nearest = candidates.reduce<SpectrumLine | null>(
		(best, line) => (!best || distance(line) < distance(best) ? line : best),
		null
	);
	if (!nearest || distance(nearest) > reachHz(frequencyHz) + fartherHz) return null;
	const centreHz = nearest.frequencyHz;
	const here = candidates.filter((line) => Math.abs(line.frequencyHz - centreHz) <= SAME_HZ);
	return {
		frequencyHz: centreHz,
		powerMw: here.reduce((sum, line) => sum + line.powerMw, 0),
		levelMw: here.reduce((sum, line) => sum + line.levelMw, 0)
	};
}
