/** Complex Gaussian noise with the resolution filter's own correlation, on the frame's lattice. */
import type { Random } from './random';

/**
 * White normals stand on a coarse lattice of at least 3.4 per 1/B and are joined by the filter's impulse response
 * exp(−π²t²/c), cut at ±1/B where it is below 10⁻³: power ripple 2·2^(−3.4²) < 0.1 %.
 * One set of taps per phase between coarse points, each normalised so that the sum of squares is 1.
 */
export class GaussianProcess {
	private readonly stride: number;
	private readonly reach: number;
	private readonly taps: Float64Array[];
	private readonly coarse: number;
	private readonly re: Float64Array;
	private readonly im: Float64Array;

	/**
	 * @param widthHz 3 dB width of the correlation's filter, Hz
	 * @param stepS lattice step, s; at most 1/(3.4·widthHz)
	 * @param total samples to make
	 */
	constructor(
		widthHz: number,
		stepS: number,
		readonly total: number
	) {
		this.stride = Math.max(1, Math.floor(1 / (3.4 * widthHz * stepS)));
		const coarseS = this.stride * stepS;
		this.reach = Math.ceil(1 / (widthHz * coarseS));
		const decay = (Math.PI * Math.PI * widthHz * widthHz) / (2 * Math.LN2);
		this.taps = Array.from({ length: Math.min(this.stride, total) }, (_, phase) => {
			const taps = Float64Array.from({ length: 2 * this.reach + 1 }, (__, j) => {
				const t = (j - this.reach) * coarseS - phase * stepS;
				return Math.exp(-decay * t * t);
			});
			const norm = 1 / Math.sqrt(taps.reduce((sum, g) => sum + g * g, 0));
			return taps.map((g) => g * norm);
		});
		this.coarse = Math.ceil(total / this.stride) + 2 * this.reach + 1;
		this.re = new Float64Array(this.coarse);
		this.im = new Float64Array(this.coarse);
	}

	/** Adds amplitude[i] × (unit normal + j·unit normal) to re and im: amplitude √(V/2) gives mean power V. */
	addTo(random: Random, amplitude: Float64Array, re: Float64Array, im: Float64Array): void {
		random.fillNormals(this.re, this.coarse);
		random.fillNormals(this.im, this.coarse);
		const { stride, total } = this;
		const width = 2 * this.reach + 1;
		const wr = this.re;
		const wi = this.im;
		for (let phase = 0; phase < this.taps.length; phase++) {
			const taps = this.taps[phase];
			for (let i = phase, base = 0; i < total; i += stride, base++) {
				let x = 0;
				let y = 0;
				for (let j = 0; j < width; j++) {
					const g = taps[j];
					x += g * wr[base + j];
					y += g * wi[base + j];
				}
				const a = amplitude[i];
				re[i] += a * x;
				im[i] += a * y;
			}
		}
	}
}
