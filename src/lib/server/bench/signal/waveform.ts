/** The pieces a modulated waveform is made of, symbol by symbol; the sweep turns them into seeded samples. */
import { normalIntegral } from './normal-integral';

export interface RrcPulse {
	perSymbol: number;
	halfSymbols: number;
	/** Pulse at (i − perSymbol·halfSymbols)/perSymbol symbols. Unit-power symbols through it have mean power 1. */
	taps: Float64Array;
	/** The same by phase: at phase·(2·halfSymbols + 1) + j the tap that symbol j of those reached counts with, phase 0 … perSymbol. */
	byPhase: Float64Array;
}

const PER_SYMBOL = 256;
const HALF_SYMBOLS = 16;

/**
 * Root-raised-cosine pulse over ±16 symbols, 256 samples a symbol, tapered by a raised cosine over the last quarter
 * (12 to 16 symbols) so that cutting it leaves no splatter.
 */
export function rrcPulse(rollOff: number): RrcPulse {
	const middle = PER_SYMBOL * HALF_SYMBOLS;
	const taps = new Float64Array(2 * middle + 1);
	let energy = 0;
	for (let i = 0; i < taps.length; i++) {
		const t = (i - middle) / PER_SYMBOL;
		taps[i] = rootRaisedCosine(t, rollOff) * taper(Math.abs(t));
		energy += taps[i] * taps[i];
	}
	const scale = Math.sqrt(PER_SYMBOL / energy);
	for (let i = 0; i < taps.length; i++) taps[i] *= scale;
	return { perSymbol: PER_SYMBOL, halfSymbols: HALF_SYMBOLS, taps, byPhase: tapsByPhase(taps) };
}

/** Taps that meet in one sum side by side: a symbol apart in the pulse, they would each be fetched from elsewhere in memory. */
function tapsByPhase(taps: Float64Array): Float64Array {
	const width = 2 * HALF_SYMBOLS + 1;
	const byPhase = new Float64Array((PER_SYMBOL + 1) * width);
	for (let phase = 0; phase <= PER_SYMBOL; phase++)
		for (let j = 0; j < width; j++)
			byPhase[phase * width + j] = taps[(width - 1 - j) * PER_SYMBOL + phase] ?? 0;
	return byPhase;
}

function taper(symbols: number): number {
	const flat = 0.75 * HALF_SYMBOLS;
	if (symbols <= flat) return 1;
	return 0.5 * (1 + Math.cos((Math.PI * (symbols - flat)) / (HALF_SYMBOLS - flat)));
}

/** Impulse response of the root-raised-cosine filter, t in symbols (Proakis; limits at its two removable poles). */
function rootRaisedCosine(t: number, rollOff: number): number {
	const a = rollOff;
	if (t === 0) return 1 - a + (4 * a) / Math.PI;
	if (Math.abs(Math.abs(4 * a * t) - 1) < 1e-7) {
		const x = Math.PI / (4 * a);
		return (a / Math.SQRT2) * ((1 + 2 / Math.PI) * Math.sin(x) + (1 - 2 / Math.PI) * Math.cos(x));
	}
	const numerator = Math.sin(Math.PI * t * (1 - a)) + 4 * a * t * Math.cos(Math.PI * t * (1 + a));
	return numerator / (Math.PI * t * (1 - (4 * a * t) ** 2));
}

export interface MskPhase {
	perBit: number;
	/** The phase moves only within ± this many bits of the bit's middle. */
	halfBits: number;
	/** Phase in rad at (i − perBit·halfBits)/perBit bits from the bit's middle: rises from 0 to π/2; times ±1 for the bit. */
	q: Float64Array;
}

/**
 * Phase pulse of minimum-shift keying, 256 samples a bit. Without `bt` the frequency pulse is one bit long and flat;
 * with it, that pulse passed through a Gaussian filter of 3 dB bandwidth bt × bit rate (Murota & Hirade 1981),
 * cut at six standard deviations and scaled so that every bit still turns the phase by exactly π/2.
 */
export function mskPhase(bt?: number): MskPhase {
	const deviation = bt === undefined ? 0 : Math.sqrt(Math.LN2) / (2 * Math.PI * bt);
	const halfBits = bt === undefined ? 0.5 : Math.ceil(2 * (0.5 + 6 * deviation)) / 2;
	const middle = PER_SYMBOL * halfBits;
	const q = Float64Array.from({ length: 2 * middle + 1 }, (_, i) => {
		const t = (i - middle) / PER_SYMBOL;
		return ramp(t + 0.5, deviation) - ramp(t - 0.5, deviation);
	});
	const first = q[0];
	const scale = Math.PI / 2 / (q[q.length - 1] - first);
	for (let i = 0; i < q.length; i++) q[i] = (q[i] - first) * scale;
	return { perBit: PER_SYMBOL, halfBits, q };
}

/** ∫ of the normal integral of the given deviation, in bits: max(t, 0) where the deviation is 0. */
function ramp(t: number, deviation: number): number {
	if (deviation === 0) return Math.max(t, 0);
	const x = t / deviation;
	return t * normalIntegral(x) + (deviation * Math.exp((-x * x) / 2)) / Math.sqrt(2 * Math.PI);
}

export interface Constellation {
	re: Float64Array;
	im: Float64Array;
}

/** Points of BPSK (2), QPSK (4) or square QAM (16, 64, 256), scaled to unit mean power. */
export function constellation(order: 2 | 4 | 16 | 64 | 256): Constellation {
	if (order === 2) return { re: Float64Array.of(-1, 1), im: new Float64Array(2) };
	const side = Math.sqrt(order);
	const scale = Math.sqrt(3 / (2 * (order - 1)));
	const level = (i: number) => (2 * i - side + 1) * scale;
	return {
		re: Float64Array.from({ length: order }, (_, i) => level(i % side)),
		im: Float64Array.from({ length: order }, (_, i) => level(Math.floor(i / side)))
	};
}
