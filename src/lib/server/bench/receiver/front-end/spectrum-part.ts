import type { Density } from '$lib/server/bench/signal/emitter-kind';
import type { SpectrumPart } from './filtered-power';

/** Shares of the whole below this are taken from the density: a difference of two cumulative shares has lost its digits. */
const DEEP = 1e-9;
/** Two-point Gauss–Legendre rule: distance of its points from the middle, in half widths. */
const GAUSS = 1 / Math.sqrt(3);

/**
 * A density as it arrives behind gains and losses.
 * @param gainAt power gain at a frequency, linear
 */
export function spectrumPart(density: Density, gainAt: (frequencyHz: number) => number): SpectrumPart {
	// Cells follow one another: the end of the last is the beginning of the next.
	let lastHz = NaN;
	let lastShare = 0;
	return {
		startHz: density.startHz,
		stopHz: density.stopHz,
		breaksHz: density.breaksHz,
		powerMw(fromHz, toHz) {
			const before = fromHz === lastHz ? lastShare : density.cumulative(fromHz);
			lastHz = toHz;
			lastShare = density.cumulative(toHz);
			const middleHz = (fromHz + toHz) / 2;
			const share = lastShare - before;
			if (share > DEEP) return share * density.powerMw * gainAt(middleHz);
			const halfHz = (toHz - fromHz) / 2;
			const low = density.densityMwPerHz(middleHz - GAUSS * halfHz);
			const high = density.densityMwPerHz(middleHz + GAUSS * halfHz);
			return (low + high) * halfHz * gainAt(middleHz);
		}
	};
}
