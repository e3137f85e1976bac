/** The resolution filter as a finite sum, for what has no closed answer: a waveform on a lattice finer than the frame's. */
import { sharedTransform } from './shared-transform';

/** The impulse response is cut at ±1.15/B, where it is below 10⁻⁴ of its peak. */
export const CUT_RBW = 1.15;

/** The spectrum's way costs some hundred operations a sample, both transforms included; the plain sum two for each tap. */
const WORTH_A_TRANSFORM = 60;

export class GaussianFir {
	/** Fine samples that the filter reaches to either side. */
	readonly half: number;
	private readonly taps: Float64Array;
	private fast?: FastSum;

	/**
	 * @param c the filter's constant, s²
	 * @param stepS fine step, s
	 * @param fine fine steps to a lattice step
	 */
	constructor(
		rbwHz: number,
		c: number,
		stepS: number,
		private readonly fine: number
	) {
		this.half = Math.ceil(CUT_RBW / rbwHz / stepS);
		const decay = (Math.PI * Math.PI) / c;
		const taps = Float64Array.from({ length: 2 * this.half + 1 }, (_, j) =>
			Math.exp(-decay * ((j - this.half) * stepS) ** 2)
		);
		const sum = taps.reduce((a, b) => a + b, 0);
		this.taps = taps.map((g) => g / sum);
	}

	/** Adds (ar + j·ai) × the filtered x + j·y to lattice indexes from…to; x and y begin `half` fine samples before `from`. */
	addTo(
		from: number,
		to: number,
		x: Float64Array,
		y: Float64Array,
		ar: number,
		ai: number,
		re: Float64Array,
		im: Float64Array
	): void {
		const { taps, half, fine } = this;
		if (half * (to - from) > WORTH_A_TRANSFORM * (2 * half + 1 + (to - from) * fine)) {
			this.addFast(from, to, x, y, ar, ai, re, im);
			return;
		}
		for (let i = from, centre = half; i < to; i++, centre += fine) {
			let sx = taps[half] * x[centre];
			let sy = taps[half] * y[centre];
			for (let j = 1; j <= half; j++) {
				const g = taps[half + j];
				sx += g * (x[centre - j] + x[centre + j]);
				sy += g * (y[centre - j] + y[centre + j]);
			}
			re[i] += ar * sx - ai * sy;
			im[i] += ar * sy + ai * sx;
		}
	}

	/** The same by way of the spectrum: a product there is a sum here, and a long filter costs no more than a short one. */
	private addFast(
		from: number,
		to: number,
		x: Float64Array,
		y: Float64Array,
		ar: number,
		ai: number,
		re: Float64Array,
		im: Float64Array
	): void {
		const { half, fine } = this;
		const count = (to - from - 1) * fine + 1 + 2 * half;
		if (!this.fast || this.fast.size < count || this.fast.size >= 4 * count)
			this.fast = new FastSum(this.taps, count);
		const sum = this.fast.of(x, y, count);
		for (let i = from, at = 2 * (2 * half); i < to; i++, at += 2 * fine) {
			re[i] += ar * sum[at] - ai * sum[at + 1];
			im[i] += ar * sum[at + 1] + ai * sum[at];
		}
	}
}

/** A filter's taps as a spectrum. */
class FastSum {
	readonly size: number;
	/** Complex pairs. */
	private readonly taps: Float64Array;

	/** @param count samples at most */
	constructor(taps: Float64Array, count: number) {
		let size = 16;
		while (size < count) size *= 2;
		this.size = size;
		const { fft, signal, spectrum } = sharedTransform(size);
		signal.fill(0);
		taps.forEach((tap, i) => (signal[2 * i] = tap));
		fft.transform(spectrum, signal);
		this.taps = Float64Array.from(spectrum);
	}

	/** Σ taps[k]·(x + j·y)[i − k], complex pairs by i: whole from the last tap's index on, wrapped round before. */
	of(x: Float64Array, y: Float64Array, count: number): number[] {
		const { taps, size } = this;
		const { fft, signal, spectrum } = sharedTransform(size);
		for (let i = 0; i < size; i++) {
			signal[2 * i] = i < count ? x[i] : 0;
			signal[2 * i + 1] = i < count ? y[i] : 0;
		}
		fft.transform(spectrum, signal);
		for (let i = 0; i < 2 * size; i += 2) {
			const p = spectrum[i];
			const q = spectrum[i + 1];
			spectrum[i] = p * taps[i] - q * taps[i + 1];
			spectrum[i + 1] = p * taps[i + 1] + q * taps[i];
		}
		fft.inverseTransform(signal, spectrum);
		return signal;
	}
}
