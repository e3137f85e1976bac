/**
 * Fourth and sixth moments of a root-raised-cosine waveform, exactly: a sum of independent symbols through a pulse is
 * a linear process, so its joint moments are sums over the ways to split them into joint cumulants of one symbol
 * (Leonov & Shiryaev 1959). Pulses are sampled eight times a symbol: nothing here is wider than that resolves.
 */
import { constellation, rrcPulse } from './waveform';

export type Order = 2 | 4 | 16 | 64 | 256;

/** Samples a symbol. Sixth-order products hold harmonics of the symbol rate up to 6, so 8 phases average exactly. */
export const MOMENT_PHASES = 8;

export interface WaveformMoments {
	/** E|x|⁴ for E|x|² = 1. */
	kurtosis: number;
	/** Autocorrelation of x|x|² − κx at lags n/8 symbol, n = 0 …, unit mean power. */
	residual: Float64Array;
	/** Autocorrelation of x itself at the same lags. */
	plain: Float64Array;
}

/** Joint cumulants of one symbol: two starred of four, three starred of six. */
function symbolCumulants(order: Order): { four: number; six: number } {
	const { re, im } = constellation(order);
	let fourth = 0;
	let sixth = 0;
	for (let i = 0; i < re.length; i++) {
		const power = re[i] ** 2 + im[i] ** 2;
		fourth += power ** 2 / re.length;
		sixth += power ** 3 / re.length;
	}
	// Real symbols pair with themselves as well, which gives the cumulants of a real variable.
	if (order === 2) return { four: fourth - 3, six: sixth - 15 * fourth + 30 };
	return { four: fourth - 2, six: sixth - 9 * fourth + 12 };
}

/** How many ways each split occurs, for complex symbols (E a² = 0) and for real ones. */
const COMPLEX = { ends: 2, cross: 5, cube: 2, mixed: 4, pair: 2 };
const REAL = { ends: 3, cross: 9, cube: 6, mixed: 9, pair: 3 };

const prepared = new Map<string, WaveformMoments>();

/** Moments of the waveform of `order` and `rollOff`, remembered. */
export function waveformMoments(order: Order, rollOff: number): WaveformMoments {
	const key = `${order} ${rollOff}`;
	let moments = prepared.get(key);
	if (!moments) {
		if (prepared.size >= 64) prepared.clear();
		moments = computeMoments(order, rollOff);
		prepared.set(key, moments);
	}
	return moments;
}

/** κ = E|x|⁴/P² of the waveform. */
export const waveformKurtosis = (order: Order, rollOff: number): number =>
	waveformMoments(order, rollOff).kurtosis;

function computeMoments(order: Order, rollOff: number): WaveformMoments {
	const pulse = rrcPulse(rollOff);
	const stride = pulse.perSymbol / MOMENT_PHASES;
	const p = Float64Array.from(
		{ length: (pulse.taps.length - 1) / stride + 1 },
		(_, i) => pulse.taps[i * stride]
	);
	const { four, six } = symbolCumulants(order);
	const ways = order === 2 ? REAL : COMPLEX;
	const lags = p.length;
	const plain = new Float64Array(lags);
	const sixth = new Float64Array(lags);
	const crossed = new Float64Array(lags);
	for (let lag = 0; lag < lags; lag++) {
		for (let phase = 0; phase < MOMENT_PHASES; phase++) {
			let s11 = 0;
			let s20 = 0;
			let s02 = 0;
			let s31 = 0;
			let s13 = 0;
			let s22 = 0;
			let s33 = 0;
			for (let i = phase - Math.ceil(lag / MOMENT_PHASES) * MOMENT_PHASES; i < p.length; i += MOMENT_PHASES) {
				const u = i >= 0 ? p[i] : 0;
				const v = i + lag >= 0 && i + lag < p.length ? p[i + lag] : 0;
				const uv = u * v;
				s11 += uv;
				s20 += u * u;
				s02 += v * v;
				s31 += uv * u * u;
				s13 += uv * v * v;
				s22 += uv * uv;
				s33 += uv * uv * uv;
			}
			plain[lag] += s11;
			sixth[lag] +=
				six * s33 +
				four * (ways.ends * (s20 * s13 + s02 * s31) + ways.cross * s11 * s22) +
				ways.cube * s11 ** 3 +
				ways.mixed * s20 * s02 * s11;
			crossed[lag] += four * (s31 + s13) + ways.pair * (s20 + s02) * s11;
		}
	}
	// At lag 0 both crossed moments are E|x|⁴.
	const kurtosis = crossed[0] / (2 * MOMENT_PHASES);
	const residual = sixth.map(
		(value, lag) => (value - kurtosis * crossed[lag] + kurtosis ** 2 * plain[lag]) / MOMENT_PHASES
	);
	return { kurtosis, residual, plain: plain.map((value) => value / MOMENT_PHASES) };
}
