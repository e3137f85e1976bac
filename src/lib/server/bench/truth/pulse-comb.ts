import { dbmToMilliwatts } from '$lib/units/decibel';
import type { EmitterOf } from '$lib/schemas/scene';
import type { SpectrumLine } from './spectrum';

/** The lines of a pulse train: too many to list, so worked out where they are asked for. */
export interface PulseComb {
	centreHz: number;
	spacingHz: number;
	/** All of them, mW: the peak times the duty. */
	totalMw: number;
	/** Line `n` spacings from the centre. */
	line(n: number): SpectrumLine;
	/** Power below `frequencyHz`, a line on it included, mW. */
	below(frequencyHz: number): number;
	/** The farthest n at which a line may be within `db` of the strongest. */
	reach(db: number): number;
}

/** Sums are kept so far out; less than 1/(π²·duty·this) of the power lies beyond. */
const MOST_SUMMED = 4_000_000;

/** Lines at the repetition rate, amplitude duty·sinc(n·duty) of the pulse's. */
export function pulseComb({ frequencyHz, levelDbm, widthS, periodS }: EmitterOf<'pulsed'>): PulseComb {
	const duty = widthS / periodS;
	const spacingHz = 1 / periodS;
	const peakMw = dbmToMilliwatts(levelDbm);
	const power = (n: number): number => {
		const x = Math.PI * n * duty;
		return peakMw * duty * duty * (n === 0 ? 1 : (Math.sin(x) / x) ** 2);
	};
	// sums[n]: lines 1 … n of one side.
	let sums = Float64Array.of(0);
	const sumTo = (n: number): number => {
		const wanted = Math.min(n, MOST_SUMMED);
		if (wanted >= sums.length) {
			const longer = new Float64Array(Math.min(MOST_SUMMED + 1, Math.max(wanted + 1, 2 * sums.length)));
			longer.set(sums);
			for (let i = sums.length; i < longer.length; i++) longer[i] = longer[i - 1] + power(i);
			sums = longer;
		}
		return sums[wanted];
	};
	const middleMw = (peakMw * duty - power(0)) / 2;
	return {
		centreHz: frequencyHz,
		spacingHz,
		totalMw: peakMw * duty,
		line(n) {
			const powerMw = power(n);
			return { frequencyHz: frequencyHz + n * spacingHz, powerMw, levelMw: powerMw };
		},
		below(atHz) {
			// A hair of slack: a line asked for by its own frequency must not fall to rounding.
			const n = Math.floor((atHz - frequencyHz) / spacingHz + 1e-9);
			return n >= 0 ? middleMw + power(0) + sumTo(n) : middleMw - sumTo(-n - 1);
		},
		reach: (db) => Math.ceil(10 ** (db / 20) / (Math.PI * duty))
	};
}

/** The lines of `comb` from `startHz` to `stopHz`, of which there may be very many. */
export function* combLines(comb: PulseComb, startHz: number, stopHz: number): Generator<SpectrumLine> {
	const last = Math.floor((stopHz - comb.centreHz) / comb.spacingHz + 1e-9);
	for (let n = Math.ceil((startHz - comb.centreHz) / comb.spacingHz - 1e-9); n <= last; n++)
		yield comb.line(n);
}
