/** The common distance of lines that stand at whole multiples of it from a carrier: modulating frequency, or repetition. */
import type { SpectralLine } from './find-line';

export interface LineSpacing {
	spacingHz: number;
	/** Exact place of the carrier on that grid. */
	carrierHz: number;
	/** How well the grid fits: r.m.s. distance of the lines from it, over the spacing. */
	misfit: number;
}

/**
 * The widest spacing that puts every line within a tenth of a whole multiple, then fitted to all of them.
 * @param lines two or more, by frequency
 * @param nearHz where the carrier is, to a fraction of the spacing; there may be no line there
 * @param toleranceHz how far off a line's frequency may be
 * @returns null when no spacing fits
 */
export function lineSpacing(lines: SpectralLine[], nearHz: number, toleranceHz: number): LineSpacing | null {
	const gaps = lines.slice(1).map(({ frequencyHz }, i) => frequencyHz - lines[i].frequencyHz);
	const candidates = gaps.filter((gap) => gap > 0).sort((a, b) => b - a);
	for (const candidate of candidates) {
		const fitted = fit(lines, candidate, toleranceHz);
		if (fitted)
			return {
				...fitted,
				carrierHz:
					fitted.originHz + Math.round((nearHz - fitted.originHz) / fitted.spacingHz) * fitted.spacingHz
			};
	}
	return null;
}

/** Least squares of frequency over number, numbers counted from the strongest line. */
function fit(
	lines: SpectralLine[],
	spacingHz: number,
	toleranceHz: number
): { spacingHz: number; originHz: number; misfit: number } | null {
	const strongest = lines.reduce((a, b) => (b.levelDbm > a.levelDbm ? b : a));
	const numbers = lines.map(({ frequencyHz }) =>
		Math.round((frequencyHz - strongest.frequencyHz) / spacingHz)
	);
	if (new Set(numbers).size < numbers.length) return null;
	const meanN = mean(numbers);
	const meanHz = mean(lines.map(({ frequencyHz }) => frequencyHz));
	let products = 0;
	let squares = 0;
	lines.forEach(({ frequencyHz }, i) => {
		products += (numbers[i] - meanN) * (frequencyHz - meanHz);
		squares += (numbers[i] - meanN) ** 2;
	});
	const fittedHz = products / squares;
	const originHz = meanHz - meanN * fittedHz;
	const offsets = lines.map(({ frequencyHz }, i) => frequencyHz - originHz - numbers[i] * fittedHz);
	const allowedHz = Math.max(toleranceHz, fittedHz / 10);
	if (!(fittedHz > 0) || offsets.some((offset) => Math.abs(offset) > allowedHz)) return null;
	return {
		spacingHz: fittedHz,
		originHz,
		misfit: Math.sqrt(mean(offsets.map((offset) => offset ** 2))) / fittedHz
	};
}

const mean = (values: number[]): number => values.reduce((a, b) => a + b, 0) / values.length;
