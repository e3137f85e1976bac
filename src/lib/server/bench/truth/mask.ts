import { milliwattsToDbm } from '$lib/units/decibel';
import { BenchError } from '../bench-error';
import { combLines, type PulseComb } from './pulse-comb';
import { powerBetween, type Spectrum, type SpectrumLine } from './spectrum';
import type { TruthOf } from './truth-kind';
import type { QuantityOf } from '$lib/schemas/quantity';

type Limit = QuantityOf<'mask'>['limits'][number];

interface Margin {
	segment: number;
	frequencyHz: number;
	marginDb: number;
}

/**
 * The worst margin to a limit over all segments, dB; positive passes. Of lines, or, with `bandwidthHz`, of all the power
 * in that width wherever in the segment it is centred.
 */
export const mask: TruthOf<'mask'> = ({ spectrum }, { limits, bandwidthHz }) => {
	const margins = limits.flatMap((limit, segment): Margin[] => {
		const worst = bandwidthHz ? worstWindow(spectrum(), limit, bandwidthHz) : worstLine(spectrum(), limit);
		if (!worst) return [];
		const marginDb = limit.levelDbm - milliwattsToDbm(worst.powerMw);
		return [{ segment, frequencyHz: worst.frequencyHz, marginDb }];
	});
	if (margins.length === 0) throw new BenchError('limits', 'limits: there is no power in any segment');
	const worst = margins.reduce((a, b) => (b.marginDb < a.marginDb ? b : a));
	return { value: worst.marginDb, unit: 'dB', parts: worst };
};

interface Found {
	frequencyHz: number;
	powerMw: number;
}

function worstLine({ lines, combs, densities }: Spectrum, { startHz, stopHz }: Limit): Found | null {
	if (densities.some((density) => density.cumulative(stopHz) - density.cumulative(startHz) > 1e-12))
		throw new BenchError(
			'bandwidthHz',
			`bandwidthHz: from ${startHz} to ${stopHz} Hz there is more than lines, so a limit needs a reference bandwidth`
		);
	const inside = lines.filter((line) => line.frequencyHz >= startHz && line.frequencyHz <= stopHz);
	for (const comb of combs) inside.push(...strongestOf(comb, startHz, stopHz));
	return strongest(inside.map(({ frequencyHz, levelMw }) => ({ frequencyHz, powerMw: levelMw })));
}

function strongestOf(comb: PulseComb, startHz: number, stopHz: number): SpectrumLine[] {
	let best: SpectrumLine | null = null;
	for (const line of combLines(comb, startHz, stopHz)) if (!best || line.levelMw > best.levelMw) best = line;
	return best ? [best] : [];
}

/** Places looked at across one segment, and how often the best one is closed in on. */
const LOOK = 1000;
const CLOSER = 40;

function worstWindow(spectrum: Spectrum, { startHz, stopHz }: Limit, bandwidthHz: number): Found | null {
	const powerAt = (frequencyHz: number): Found => ({
		frequencyHz,
		powerMw: powerBetween(spectrum, frequencyHz - bandwidthHz / 2, frequencyHz + bandwidthHz / 2)
	});
	const look = Array.from({ length: LOOK + 1 }, (_, i) => startHz + ((stopHz - startHz) * i) / LOOK);
	const onLines = spectrum.lines
		.filter(
			(line) => line.frequencyHz > startHz - bandwidthHz / 2 && line.frequencyHz < stopHz + bandwidthHz / 2
		)
		.map((line) => Math.min(stopHz, Math.max(startHz, line.frequencyHz)));
	let best = strongest([...look, ...onLines].map(powerAt));
	let reach = (stopHz - startHz) / LOOK;
	for (let i = 0; best && i < CLOSER; i++, reach *= 0.7) {
		const around = [best.frequencyHz - reach, best.frequencyHz + reach].filter(
			(f) => f >= startHz && f <= stopHz
		);
		best = strongest([best, ...around.map(powerAt)]);
	}
	return best;
}

const strongest = (found: Found[]): Found | null => {
	const best = found.reduce<Found | null>((a, b) => (!a || b.powerMw > a.powerMw ? b : a), null);
	return best && best.powerMw > 0 ? best : null;
};
