import { BenchError } from '../bench-error';
import { powerBetween, totalPower, type Spectrum } from './spectrum';
import type { TruthOf } from './truth-kind';

/**
 * Width between the frequencies below and above which half of the rest of the power lies (Radio Regulations 1.153: 0.5 %
 * on either side for 99 %), of everything or inside a stated window. Hz.
 */
export const occupiedBandwidth: TruthOf<'occupied-bandwidth'> = (
	{ spectrum },
	{ centreHz, widthHz, percent }
) => {
	const windowed = centreHz !== undefined && widthHz !== undefined;
	const [startHz, stopHz] = windowed
		? [centreHz - widthHz / 2, centreHz + widthHz / 2]
		: extentOf(spectrum());
	const totalMw = windowed ? powerBetween(spectrum(), startHz, stopHz) : totalPower(spectrum());
	if (!(totalMw > 0)) throw new BenchError('centreHz', 'centreHz: there is no power in the window');
	const below = powerBelow(spectrum(), windowed ? startHz : null);
	const outside = (1 - percent / 100) / 2;
	const lowerHz = frequencyOf(below, outside * totalMw, startHz, stopHz);
	const upperHz = frequencyOf(below, (1 - outside) * totalMw, startHz, stopHz);
	return { value: upperHz - lowerHz, unit: 'Hz', parts: { lowerHz, upperHz } };
};

/** Where all that is listed lies, and far beyond: tails that fall slowly count too. */
function extentOf({ lines, combs, densities }: Spectrum): [number, number] {
	const edges = [
		...lines.map((line) => line.frequencyHz),
		...combs.flatMap((comb) => [-1, 1].map((side) => comb.line(side * comb.reach(0)).frequencyHz)),
		...densities.flatMap((density) => [density.startHz, density.stopHz])
	];
	if (edges.length === 0) throw new BenchError('kind', 'kind: the scene has no power');
	const startHz = edges.reduce((a, b) => Math.min(a, b));
	const stopHz = edges.reduce((a, b) => Math.max(a, b));
	const beyondHz = 1e3 * (stopHz - startHz);
	return [startHz - beyondHz, stopHz + beyondHz];
}

/** Power below a frequency, the line on it included; from `startHz` on, or from −∞ (null). */
function powerBelow(spectrum: Spectrum, startHz: number | null): (frequencyHz: number) => number {
	const { lines, combs, densities } = spectrum;
	const sums = new Float64Array(lines.length + 1);
	lines.forEach((line, i) => {
		sums[i + 1] = sums[i] + line.powerMw;
	});
	const linesBelow = (frequencyHz: number): number => {
		let low = 0;
		let high = lines.length;
		while (low < high) {
			const middle = (low + high) >> 1;
			if (lines[middle].frequencyHz <= frequencyHz) low = middle + 1;
			else high = middle;
		}
		return sums[low];
	};
	const restBelow = (frequencyHz: number): number =>
		densities.reduce((sum, density) => sum + density.powerMw * density.cumulative(frequencyHz), 0) +
		combs.reduce((sum, comb) => sum + comb.below(frequencyHz), 0);
	// Just below the start: a line on it is inside.
	const startsAt = startHz === null ? null : startHz - 1e-9 * Math.max(1, Math.abs(startHz) * 1e-3);
	const offset = startsAt === null ? 0 : linesBelow(startsAt) + restBelow(startsAt);
	return (frequencyHz) => linesBelow(frequencyHz) + restBelow(frequencyHz) - offset;
}

/** The lowest frequency below which `powerMw` lies, by bisection down to neighbouring numbers. */
function frequencyOf(
	below: (frequencyHz: number) => number,
	powerMw: number,
	startHz: number,
	stopHz: number
): number {
	let low = startHz;
	let high = stopHz;
	for (let i = 0; i < 200; i++) {
		const middle = (low + high) / 2;
		if (middle === low || middle === high) break;
		if (below(middle) >= powerMw) high = middle;
		else low = middle;
	}
	return high;
}
