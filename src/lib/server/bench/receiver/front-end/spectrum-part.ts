import type { Density } from '$lib/server/bench/signal/emitter-kind';
import type { SpectrumPart } from './filtered-power';

/** Shares of the whole below this are taken from the density: a difference of two cumulative shares has lost its digits. */
const DEEP = 1e-9;
/** Two-point Gauss–Legendre rule: distance of its points from the middle, in half widths. */
const GAUSS = 1 / Math.sqrt(3);

/** Stretches this short against the finest detail of a spectrum are taken from its density, which costs less. */
const SHORT = 1 / 8;

/**
 * A density as it arrives behind gains and losses.
 * @param finestHz width of its finest detail between breaks
 * @param gainAt power gain at a frequency, linear
 */
export function spectrumPart(
	density: Density,
	finestHz: number,
	gainAt: (frequencyHz: number) => number
): SpectrumPart {
	const shortHz = SHORT * finestHz;
	// Cells follow one another: the end of the last is the beginning of the next.
	let lastHz = NaN;
	let lastShare = 0;
	return {
		startHz: density.startHz,
		stopHz: density.stopHz,
		breaksHz: density.breaksHz,
		powerMw(fromHz, toHz) {
			const middleHz = (fromHz + toHz) / 2;
			if (toHz - fromHz > shortHz) {
				const before = fromHz === lastHz ? lastShare : density.cumulative(fromHz);
				lastHz = toHz;
				lastShare = density.cumulative(toHz);
				const share = lastShare - before;
				if (share > DEEP) return share * density.powerMw * gainAt(middleHz);
			}
			const halfHz = (toHz - fromHz) / 2;
			const low = density.densityMwPerHz(middleHz - GAUSS * halfHz);
			const high = density.densityMwPerHz(middleHz + GAUSS * halfHz);
			return (low + high) * halfHz * gainAt(middleHz);
		}
	};
}
