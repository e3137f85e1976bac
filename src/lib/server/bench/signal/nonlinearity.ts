/** A stage that bends: the device under test, the receiver's mixer. */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { densityProducts, type ProductDensity } from './density-products';
import type { Density, Line } from './emitter-kind';
import { addLineProducts, type ProductLine } from './line-products';
import { scaleDensity } from './scale-density';

export interface NonlinearLimits {
	/** Third-order intercept at the stage's input; null: no third order. */
	toiDbm: number | null;
	/** Second-harmonic intercept; null: no second order. */
	shiDbm: number | null;
	/** Phase of the products against what they are made of; absent: 0. */
	phaseRad?: number;
	/** Product lines weaker than this are dropped, after adding those of equal frequency; absent: −250 dBm. */
	floorDbm?: number;
}

export interface Distorted {
	/** The input lines in their order, with gain and with what fell on them; then the new ones. */
	lines: ProductLine[];
	/** The input densities in their order, with gain; then the new ones. */
	densities: ProductDensity[];
}

const MOST_LINES = 64;
const FAINTEST_DBM = -250;

/**
 * What a stage of small-signal gain 1 makes of lines and densities, by y = x − x|x|²/P_toi on the complex envelope and x²
 * in the passband (bench.md §4). The input is first scaled by min(1, √(P_toi/(3·P_total))): beyond its maximum the
 * output stays instead of folding. The 64 strongest lines make products; all take part in the gain:
 * a line's is 1 − (P + 2·others)/P_toi, a density's 1 − (κP + 2·others)/P_toi, κ its fourth-moment ratio.
 */
export function distort(lines: Line[], densities: Density[], limits: NonlinearLimits): Distorted {
	const toiMw = limits.toiDbm === null ? null : dbmToMilliwatts(limits.toiDbm);
	const shiMw = limits.shiDbm === null ? null : dbmToMilliwatts(limits.shiDbm);
	if (toiMw === null && shiMw === null) return { lines, densities };
	const inputMw =
		lines.reduce((sum, line) => sum + powerOf(line), 0) + densities.reduce((sum, d) => sum + d.powerMw, 0);
	const share = toiMw === null ? 1 : Math.min(1, toiMw / (3 * inputMw));
	const entered = share === 1 ? lines : lines.map((line) => scaleLine(line, Math.sqrt(share)));
	const enteredDensities = share === 1 ? densities : densities.map((d) => scaleDensity(d, share));
	const totalMw = inputMw * share;
	const gain = (powerMw: number, kurtosis: number): number =>
		toiMw === null ? 1 : 1 - (kurtosis * powerMw + 2 * (totalMw - powerMw)) / toiMw;
	const strongest = entered
		.map((_, i) => i)
		.sort((a, b) => powerOf(entered[b]) - powerOf(entered[a]))
		.slice(0, MOST_LINES);
	const products = addLineProducts(entered, strongest, {
		toiMw,
		shiMw,
		phaseRad: limits.phaseRad ?? 0,
		floorMw: dbmToMilliwatts(limits.floorDbm ?? FAINTEST_DBM)
	});
	entered.forEach((line, i) => {
		// The product part that fell on the line stays; the line itself takes the gain.
		const lost = 1 - gain(powerOf(line), 1);
		products[i].re -= lost * line.re;
		products[i].im -= lost * line.im;
	});
	return {
		lines: products,
		densities: [
			...enteredDensities.map((d) => scaleDensity(d, gain(d.powerMw, d.kurtosis) ** 2)),
			...(toiMw === null ? [] : densityProducts(enteredDensities, entered, strongest, toiMw))
		]
	};
}

const powerOf = (line: Line): number => line.re * line.re + line.im * line.im;
const scaleLine = (line: Line, factor: number): Line => ({
	...line,
	re: line.re * factor,
	im: line.im * factor
});
