/** A density with the receiver's phase noise convolved into it: what it spreads, S ⊗ L. */
import type { SpectrumPart } from './filtered-power';
import type { SkirtShape } from './filtered-skirt';

/** Pieces of constant density that the spectrum is taken in. */
const PIECES = 96;
/** Distances from an edge grow by this factor from one grid frequency to the next. */
const GROWTH = 1.16;

/**
 * The spread part of a density, as a spectrum: for pieces of constant density s over (a, b) it is
 * Σ s·[Λ(f − a) − Λ(f − b)] with Λ the skirt's power from the carrier out, signed; exact for a flat band.
 * Kept on frequencies that crowd towards the density's ends, straight in logarithm between them.
 * @param source the density before spreading
 * @param finestHz detail that no filter can see
 */
export function densitySkirt(source: SpectrumPart, shape: SkirtShape, finestHz: number): SpectrumPart {
	const widthHz = source.stopHz - source.startHz;
	const edges = Float64Array.from({ length: PIECES + 1 }, (_, i) => source.startHz + (widthHz * i) / PIECES);
	const heights = Float64Array.from(
		{ length: PIECES },
		(_, i) => source.powerMw(edges[i], edges[i + 1]) / (edges[i + 1] - edges[i])
	);
	const spreadAt = (frequencyHz: number) => {
		let sum = 0;
		let before = signedPower(shape, frequencyHz - edges[0]);
		for (let i = 0; i < PIECES; i++) {
			const after = signedPower(shape, frequencyHz - edges[i + 1]);
			sum += heights[i] * (before - after);
			before = after;
		}
		return sum;
	};
	const grid = gridAbout(source.startHz, source.stopHz, shape.endHz, finestHz);
	// A level far under anything shown stands in for nothing, which has no logarithm.
	const logs = Float64Array.from(grid, (frequencyHz) => Math.log(Math.max(spreadAt(frequencyHz), 1e-300)));
	let found = 0;
	return {
		startHz: grid[0],
		stopHz: grid[grid.length - 1],
		breaksHz: [],
		powerMw(fromHz, toHz) {
			const middle = (fromHz + toHz) / 2;
			if (middle <= grid[0] || middle >= grid[grid.length - 1]) return 0;
			found = findInterval(grid, middle, found);
			const share = (middle - grid[found]) / (grid[found + 1] - grid[found]);
			return (toHz - fromHz) * Math.exp(logs[found] + share * (logs[found + 1] - logs[found]));
		}
	};
}

const signedPower = (shape: SkirtShape, offsetHz: number) =>
	offsetHz < 0 ? -shape.powerWithin(-offsetHz) : shape.powerWithin(offsetHz);

/** Rising frequencies from `reachHz` below a band to `reachHz` above it, crowding towards its ends. */
function gridAbout(startHz: number, stopHz: number, reachHz: number, finestHz: number): Float64Array {
	const offsets = (limitHz: number) => {
		const list: number[] = [];
		for (let offsetHz = finestHz; offsetHz < limitHz; offsetHz *= GROWTH) list.push(offsetHz);
		return list;
	};
	const outside = [...offsets(reachHz), reachHz];
	const inside = offsets((stopHz - startHz) / 2);
	const grid = [
		...outside.map((o) => startHz - o),
		startHz,
		...inside.map((o) => startHz + o),
		...inside.map((o) => stopHz - o),
		stopHz,
		...outside.map((o) => stopHz + o)
	];
	return Float64Array.from(grid.sort((a, b) => a - b));
}

/** Index i with grid[i] ≤ x < grid[i + 1], from a guess: neighbours in a sweep are neighbours here. */
function findInterval(grid: Float64Array, x: number, guess: number): number {
	if (x >= grid[guess] && x < grid[guess + 1]) return guess;
	if (guess + 2 < grid.length && x >= grid[guess + 1] && x < grid[guess + 2]) return guess + 1;
	let low = 0;
	let high = grid.length - 1;
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if (x >= grid[middle]) low = middle;
		else high = middle;
	}
	return low;
}
