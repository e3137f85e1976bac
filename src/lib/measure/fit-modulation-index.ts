/** The modulation index whose Bessel functions fit a set of line amplitudes best, whatever their common factor. */
import { besselOrders } from './bessel';
import { minimise } from './minimise';

export interface IndexFit {
	index: number;
	/** Common factor: the amplitude of the unmodulated carrier, in the unit of the amplitudes. */
	amplitude: number;
	/** Share of the amplitudes that the fit leaves over, 0 to 1. */
	residual: number;
}

/**
 * Least squares over the index, the common factor solved for at each.
 * @param amplitudes of carrier and pairs 1, 2 …; each pair counts twice
 */
export function fitModulationIndex(amplitudes: ArrayLike<number>): IndexFit {
	const order = amplitudes.length - 1;
	const leftOver = (index: number): number => compare(amplitudes, index).residual;
	// Coarse search first: neighbouring zeros of J_n lie about π apart, so steps of 0.05 miss no valley.
	let best = 0;
	for (let index = 0; index <= order + 1; index += 0.05) if (leftOver(index) < leftOver(best)) best = index;
	const index = minimise(leftOver, Math.max(0, best - 0.05), best + 0.05);
	return { index, ...compare(amplitudes, index) };
}

function compare(amplitudes: ArrayLike<number>, index: number): { amplitude: number; residual: number } {
	const bessel = besselOrders(amplitudes.length - 1, index);
	let [products, squares, total] = [0, 0, 0];
	for (let n = 0; n < amplitudes.length; n++) {
		const weight = n === 0 ? 1 : 2;
		products += weight * amplitudes[n] * Math.abs(bessel[n]);
		squares += weight * bessel[n] ** 2;
		total += weight * amplitudes[n] ** 2;
	}
	const explained = products ** 2 / squares / total;
	return { amplitude: products / squares, residual: Math.sqrt(Math.max(0, 1 - explained)) };
}
