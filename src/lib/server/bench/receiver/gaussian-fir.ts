/** The resolution filter as a finite sum, for what has no closed answer: a waveform on a lattice finer than the frame's. */

/** The impulse response is cut at ±1.15/B, where it is below 10⁻⁴ of its peak. */
export const CUT_RBW = 1.15;

export class GaussianFir {
	/** Fine samples that the filter reaches to either side. */
	readonly half: number;
	private readonly taps: Float64Array;

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
}
