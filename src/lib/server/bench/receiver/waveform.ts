/** Unit-power waveforms made symbol by symbol: square constellations through a root-raised-cosine pulse, and continuous-phase MSK. */
import type { EmitterOf } from '$lib/schemas/scene';
import { constellation, mskPhase, rrcPulse } from '../signal/waveform';
import type { SymbolHash } from './symbol-hash';

export interface Waveform {
	/** Half-width of what the waveform occupies, Hz: the lattice must carry it. */
	halfWidthHz: number;
	/**
	 * Fills re and im with `count` samples from bench time startS in steps of stepS.
	 * Absolute phase is the waveform's own; it need not continue from an earlier call.
	 */
	fill(startS: number, stepS: number, count: number, re: Float64Array, im: Float64Array): void;
}

/** Linear modulation: Σ symbol_k · pulse(t − k/R). */
export function digitalWaveform(emitter: EmitterOf<'digital'>, hash: SymbolHash): Waveform {
	const { re: pointRe, im: pointIm } = constellation(emitter.order);
	const { perSymbol, halfSymbols, byPhase } = rrcPulse(emitter.rollOff);
	const rate = emitter.symbolRateHz;
	const mask = emitter.order - 1;
	return {
		halfWidthHz: ((1 + emitter.rollOff) * rate) / 2,
		fill(startS, stepS, count, re, im) {
			const first = Math.floor(startS * rate) - halfSymbols;
			const symbols = Math.ceil(count * stepS * rate) + 2 * halfSymbols + 3;
			const sx = new Float64Array(symbols);
			const sy = new Float64Array(symbols);
			for (let k = 0; k < symbols; k++) {
				const point = hash.bits(first + k) & mask;
				sx[k] = pointRe[point];
				sy[k] = pointIm[point];
			}
			const fraction = startS * rate - Math.floor(startS * rate);
			const last = 2 * halfSymbols;
			const width = last + 1;
			for (let i = 0; i < count; i++) {
				// position in symbols after the first that reaches this sample
				const u = fraction + i * stepS * rate;
				const whole = Math.floor(u);
				// place of the pulse's value for symbol whole + j: (u − whole + halfSymbols − j)·perSymbol from its left end
				const at = (u - whole + last) * perSymbol;
				// rounding must not carry the position past the pulse's end
				const cell = Math.min(Math.floor(at), (last + 1) * perSymbol - 1);
				const blend = at - cell;
				const here = (cell - last * perSymbol) * width;
				const next = here + width;
				let x = 0;
				let y = 0;
				// symbol 0 lies beyond the pulse's support
				for (let j = 1; j <= last; j++) {
					const g = byPhase[here + j] + blend * (byPhase[next + j] - byPhase[here + j]);
					x += g * sx[whole + j];
					y += g * sy[whole + j];
				}
				re[i] = x;
				im[i] = y;
			}
		}
	};
}

/** Minimum shift keying (Gaussian pre-filtered with bt): every bit turns the phase by ±π/2 along the phase pulse q. */
export function mskWaveform(emitter: EmitterOf<'msk'>, hash: SymbolHash): Waveform {
	const { perBit, halfBits, q } = mskPhase(emitter.bt);
	const rate = emitter.bitRateHz;
	return {
		halfWidthHz: 1.5 * rate,
		fill(startS, stepS, count, re, im) {
			// bits up to `settledBit` have turned the phase in full; bit k's middle stands at k/rate
			const origin = Math.floor(startS * rate - halfBits);
			const bits = Math.ceil(count * stepS * rate) + 2 * Math.ceil(halfBits) + 4;
			const sign = new Float64Array(bits);
			for (let k = 0; k < bits; k++) sign[k] = hash.bits(origin + 1 + k) & 1 ? 1 : -1;
			const fraction = startS * rate - origin;
			let settled = 0;
			let counted = 0;
			for (let i = 0; i < count; i++) {
				const u = fraction + i * stepS * rate;
				const done = Math.floor(u - halfBits);
				while (counted < done) settled += sign[counted++];
				let phase = settled * (Math.PI / 2);
				for (let k = counted; k + 1 < u + halfBits; k++) {
					const at = (u - (k + 1) + halfBits) * perBit;
					const cell = Math.floor(at);
					const next = cell + 1 < q.length ? q[cell + 1] : q[cell];
					phase += sign[k] * (q[cell] + (at - cell) * (next - q[cell]));
				}
				re[i] = Math.cos(phase);
				im[i] = Math.sin(phase);
			}
		}
	};
}
