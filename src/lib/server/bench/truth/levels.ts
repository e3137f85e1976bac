/** Levels and frequencies of lines. */
import { milliwattsToDbm } from '$lib/units/decibel';
import { BenchError } from '../bench-error';
import type { Quantity } from '$lib/schemas/quantity';
import { farthestDriftHz } from './place-emitters';
import { lineAt, type SpectrumLine } from './spectrum';
import type { Subject, TruthOf } from './truth-kind';

/** The line at `frequencyHz`; where emitters drift, as far from it as they may have gone. @throws BenchError naming `field` */
function lineOrRefuse(
	subject: Subject,
	quantity: Quantity,
	frequencyHz: number,
	field: string
): SpectrumLine {
	const line =
		lineAt(subject.spectrum(), frequencyHz) ??
		lineAt(subject.spectrum(), frequencyHz, farthestDriftHz(subject.emitters, quantity));
	if (line) return line;
	throw new BenchError(field, `${field}: there is no line at ${frequencyHz} Hz`);
}

const levelDbm = (line: SpectrumLine): number => milliwattsToDbm(line.levelMw);

/** Level of the line at `atHz`, dBm, its own skirts included. */
export const marker: TruthOf<'marker'> = (subject, quantity) => {
	const line = lineOrRefuse(subject, quantity, quantity.atHz, 'atHz');
	return { value: levelDbm(line), unit: 'dBm', parts: { frequencyHz: line.frequencyHz } };
};

/** Level of the line at `toHz` over that of the line at `fromHz`, dB. */
export const delta: TruthOf<'delta'> = (subject, quantity) => {
	const from = lineOrRefuse(subject, quantity, quantity.fromHz, 'fromHz');
	const to = lineOrRefuse(subject, quantity, quantity.toHz, 'toHz');
	return {
		value: levelDbm(to) - levelDbm(from),
		unit: 'dB',
		parts: {
			frequencyHz: to.frequencyHz - from.frequencyHz,
			fromDbm: levelDbm(from),
			toDbm: levelDbm(to)
		}
	};
};

/** Level of the strongest line, dBm. */
export const peak: TruthOf<'peak'> = (subject, quantity) => {
	const { combs, lines: single } = subject.spectrum();
	const lines = [...single, ...combs.map((comb) => comb.line(0))];
	if (lines.length === 0) throw new BenchError('kind', 'kind: peak needs a line, the scene has none');
	const strongest = lines.reduce((a, b) => (b.levelMw > a.levelMw ? b : a));
	const line = lineOrRefuse(subject, quantity, strongest.frequencyHz, 'kind');
	return { value: levelDbm(line), unit: 'dBm', parts: { frequencyHz: line.frequencyHz } };
};

/** Level of the nearest line on one side of the line at `fromHz`, dBm. */
export const nextPeak: TruthOf<'next-peak'> = (subject, quantity) => {
	const { fromHz, side } = quantity;
	const from = lineAt(subject.spectrum(), fromHz)?.frequencyHz ?? fromHz;
	const away = (line: SpectrumLine) => (side === 'upper' ? line.frequencyHz - from : from - line.frequencyHz);
	const candidates = [
		...subject.spectrum().lines,
		...subject.spectrum().combs.flatMap((comb) => {
			const n = Math.round((from - comb.centreHz) / comb.spacingHz);
			return [-1, 0, 1].map((next) => comb.line(n + next));
		})
	].filter((line) => away(line) > 1e-3);
	if (candidates.length === 0)
		throw new BenchError('side', `side: there is no line on the ${side} side of ${fromHz} Hz`);
	const nearest = candidates.reduce((a, b) => (away(b) < away(a) ? b : a));
	const line = lineOrRefuse(subject, quantity, nearest.frequencyHz, 'side');
	return { value: levelDbm(line), unit: 'dBm', parts: { frequencyHz: line.frequencyHz } };
};

/** Frequency of the line at `atHz`, Hz; of a drifting one, its mean over `gateS`. */
export const count: TruthOf<'count'> = (subject, quantity) => ({
	value: lineOrRefuse(subject, quantity, quantity.atHz, 'atHz').frequencyHz,
	unit: 'Hz'
});
