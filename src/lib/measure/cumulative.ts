/** Power added up along a stretch, and where a share of it is reached. */
import { dbmToMilliwatts } from '$lib/units/decibel';
import { overlap, pointsOf, type Stretch } from './cells';
import { sumSpreadDb } from './noise-statistics';
import { frequencyAt, stepHz, type Trace } from './trace';

export interface Cumulative {
	stretch: Stretch;
	first: number;
	/** Power of each cell's part in the stretch over the whole stretch's, from point `first` on; they add up to 1. */
	shares: Float64Array;
}

export function cumulativeOf(trace: Trace, stretch: Stretch): Cumulative {
	const { first, last } = pointsOf(stretch);
	const shares = new Float64Array(last - first + 1);
	let sum = 0;
	for (let i = first; i <= last; i++)
		sum += shares[i - first] = overlap(stretch, i) * dbmToMilliwatts(trace.levelsDbm[i]);
	for (let i = 0; i < shares.length; i++) shares[i] /= sum;
	return { stretch, first, shares };
}

export interface ShareEdge {
	frequencyHz: number;
	/** One standard deviation of the frequency, if all of the power were noise. */
	noiseSpreadHz: number;
}

/** Where `share` (0 to 1) of the power lies below, straight within the cell. */
export function edgeAtShare(trace: Trace, cumulative: Cumulative, share: number): ShareEdge {
	const { stretch, first, shares } = cumulative;
	let below = 0;
	let cell = 0;
	while (cell < shares.length - 1 && below + shares[cell] < share) below += shares[cell++];
	const from = Math.max(stretch.from, first + cell - 0.5);
	const to = Math.min(stretch.to, first + cell + 0.5);
	const within = shares[cell] > 0 ? Math.min(1, (share - below) / shares[cell]) : 0.5;
	return {
		frequencyHz: frequencyAt(trace, from + within * (to - from)),
		noiseSpreadHz: noiseSpreadHz(trace, cumulative, cell, share)
	};
}

/**
 * The share Q below the edge strays as Q·(1−Q)·√(r² + s²), r and s the relative deviations of the powers below and above it;
 * divided by the share per hertz at the edge that is a frequency.
 */
function noiseSpreadHz(trace: Trace, { stretch, shares }: Cumulative, cell: number, share: number): number {
	const relative = (from: number, to: number): number => {
		let sum = 0;
		let squares = 0;
		for (let i = from; i < to; i++) {
			sum += shares[i];
			squares += shares[i] * shares[i];
		}
		return squares > 0 ? sumSpreadDb(trace, (sum * sum) / squares) / (10 / Math.LN10) : 0;
	};
	const spread = share * (1 - share) * Math.hypot(relative(0, cell + 1), relative(cell, shares.length));
	// The density over one resolution bandwidth, since a single cell is a matter of chance.
	const reach = Math.max(1, Math.round(trace.rbwHz / stepHz(trace) / 2));
	const near = shares.subarray(Math.max(0, cell - reach), cell + reach + 1);
	const perHz = near.reduce((a, b) => a + b, 0) / (near.length * stepHz(trace));
	const widthHz = (stretch.to - stretch.from) * stepHz(trace);
	return perHz > 0 ? Math.min(widthHz, spread / perHz) : widthHz;
}
