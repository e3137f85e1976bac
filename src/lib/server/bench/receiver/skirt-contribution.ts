/**
 * Phase noise close to its carrier: conjugate sidebands in quadrature with the line, so that inside the filter they turn its phase
 * and leave its level. Followed within 3.5 B of the line; farther out the skirt is a density (the front end's business).
 */
import type FFT from 'fft.js';
import type { PhaseNoisePoint } from '$lib/schemas/scene';
import { integratedPhaseNoise, phaseNoiseIntegral } from '../signal/phase-noise';
import { reachIndexes, type Contribution, type RowContext } from './contribution';
import type { Frame } from './frame';
import { SKIRT_FROM_RBW } from './front-end/filtered-skirt';
import { GaussianFir } from './gaussian-fir';
import type { IncidentLine } from './incident';
import { passing } from './line-contribution';
import type { PassingLine } from './line-response';
import { sharedTransform } from './shared-transform';

/** The lattice carries what the filter sees from 3.5 B away without folding: 12 samples per 1/B. */
const PER_RBW = 12;

/** What one stretch of samples needs, kept from row to row. */
interface SkirtPlan {
	from: number;
	to: number;
	count: number;
	fft: FFT;
	size: number;
	bins: Float64Array;
	spectrum: number[];
	phase: number[];
	x: Float64Array;
	y: Float64Array;
}

interface Mixing {
	offsetHz: number;
	mixCos: Float64Array;
	mixSin: Float64Array;
}

export class SkirtContribution implements Contribution {
	/** √carrier power over the line's amplitude: L is counted from the whole carrier. */
	private readonly whole: number;
	private readonly within: (offsetHz: number) => number;
	private readonly fine: number;
	private readonly stepS: number;
	private readonly fir: GaussianFir;
	private plan?: SkirtPlan;
	private mixed?: Mixing;

	constructor(
		private readonly line: IncidentLine,
		skirts: PhaseNoisePoint[][],
		frame: Frame,
		private readonly stream: string
	) {
		const variance = skirts.reduce((sum, points) => sum + integratedPhaseNoise(points), 0);
		// powers add; what stays in the line is exp(−σ²), the skirts hold the rest in the shape of L
		this.whole = Math.exp(variance / 2);
		const scale = variance > 0 ? -Math.expm1(-variance) / variance : 0;
		const integrals = skirts.map((points) => phaseNoiseIntegral(points));
		this.within = (f) => scale * integrals.reduce((sum, integral) => sum + integral(f), 0);
		this.fine = Math.max(1, Math.ceil(PER_RBW * frame.rbwHz * frame.stepS));
		this.stepS = frame.stepS / this.fine;
		this.fir = new GaussianFir(frame.rbwHz, frame.c, this.stepS, this.fine);
	}

	addTo(row: RowContext, frame: Frame, re: Float64Array, im: Float64Array): void {
		const line = passing(this.line, frame, row.clockS);
		const { from, to } = reachIndexes(frame, line.offsetHz, line.passingHzPerS, SKIRT_FROM_RBW * frame.rbwHz);
		if (to <= from) return;
		const { count, fft, size, bins, spectrum, phase, x, y } = this.prepared(from, to);
		const random = row.random(this.stream);
		// φ(t): a real process whose bins hold the skirt's power between them (both sides), periodic in the transform
		for (let k = 1; k < size / 2; k++) {
			const a = bins[k];
			if (a === 0) continue;
			const p = a * random.normal();
			const q = a * random.normal();
			spectrum[2 * k] = p;
			spectrum[2 * k + 1] = q;
			spectrum[2 * (size - k)] = p;
			spectrum[2 * (size - k) + 1] = -q;
		}
		fft.inverseTransform(phase, spectrum);
		const { mixCos, mixSin } = this.mixing(line, frame, from, count);
		for (let i = 0; i < count; i++) {
			const cos = mixCos[i];
			const sin = mixSin[i];
			// jφ·a·e^{jψ}; the inverse transform divides by its size
			const turn = phase[2 * i] * size * this.whole;
			x[i] = -turn * (line.re * sin + line.im * cos);
			y[i] = turn * (line.re * cos - line.im * sin);
		}
		this.fir.addTo(from, to, x, y, 1, 0, re, im);
	}

	/** e^{jψ} of the chirp over the stretch: the same for every row, as long as the line stands where it was. */
	private mixing(line: PassingLine, frame: Frame, from: number, count: number): Mixing {
		const known = this.mixed;
		if (known && known.offsetHz === line.offsetHz && known.mixCos.length === count) return known;
		const firstS = (from - frame.lead) * frame.stepS - this.fir.half * this.stepS;
		const psi = (i: number): number => {
			const t = firstS + i * this.stepS;
			return 2 * Math.PI * ((line.offsetHz * t) % 1) - Math.PI * line.passingHzPerS * t * t;
		};
		const turns = Float64Array.from({ length: count }, (_, i) => psi(i));
		this.mixed = { offsetHz: line.offsetHz, mixCos: turns.map(Math.cos), mixSin: turns.map(Math.sin) };
		return this.mixed;
	}

	private prepared(from: number, to: number): SkirtPlan {
		const known = this.plan;
		if (known && known.from === from && known.to === to) return known;
		const count = (to - from - 1) * this.fine + 1 + 2 * this.fir.half;
		let size = 16;
		while (size < count) size *= 2;
		const bins = new Float64Array(size / 2);
		const width = 1 / (size * this.stepS);
		for (let k = 1; k < size / 2; k++) {
			// each of the bin's two sides holds L's power; a cosine of amplitude A has A²/2 = 2 sides' power, x and y share it
			const power = this.within((k + 0.5) * width) - this.within((k - 0.5) * width);
			bins[k] = Math.sqrt(Math.max(0, power) / 2);
		}
		this.plan = {
			from,
			to,
			count,
			fft: sharedTransform(size).fft,
			size,
			bins,
			spectrum: new Array<number>(2 * size).fill(0),
			phase: new Array<number>(2 * size).fill(0),
			x: new Float64Array(count),
			y: new Float64Array(count)
		};
		return this.plan;
	}
}
