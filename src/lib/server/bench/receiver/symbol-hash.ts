/** Symbols of a modulated signal: any one can be looked up without those before it, so any stretch of the waveform can be entered. */
import { hash128 } from './hash128';
import { ENGINE_VERSION, type Seed } from './random';

export class SymbolHash {
	private readonly a: number;
	private readonly b: number;

	constructor(seed: Seed, emitter: number) {
		[this.a, this.b] = hash128(
			`${ENGINE_VERSION}|${typeof seed === 'number' ? 'n' : 's'}${seed}|symbols/${emitter}`
		);
	}

	/** 32 random bits for symbol number k (a whole number up to 2⁵³). Two rounds of the murmur finaliser over key and number. */
	bits(k: number): number {
		const low = k | 0;
		const high = Math.floor(k / 4294967296) | 0;
		let h = Math.imul(low ^ this.a, 0x85ebca6b) ^ Math.imul(high ^ this.b, 0xc2b2ae35);
		h ^= h >>> 16;
		h = Math.imul(h, 0x7feb352d);
		h ^= h >>> 15;
		h = Math.imul(h ^ this.b, 0x846ca68b);
		h ^= h >>> 16;
		h = Math.imul(h, 0x85ebca6b);
		h ^= h >>> 13;
		h = Math.imul(h, 0xc2b2ae35);
		return (h ^ (h >>> 16)) >>> 0;
	}
}
