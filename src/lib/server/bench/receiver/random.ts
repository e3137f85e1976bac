/**
 * Chance on the bench. One generator per (seed, row, stream), its 128-bit state hashed from all three,
 * so that rows and streams never share or overlap draws and any row can be made again on its own.
 */
import { hash128 } from './hash128';
import { layerBounds, layerEdges, TAIL_START } from './ziggurat';

/** Names the sweep's arithmetic: change it whenever the same settings would give other samples. */
export const ENGINE_VERSION = 1;

/** An integer 0…2⁵³−1 or a string (attempts use 128 random bits in hexadecimal). */
export type Seed = number | string;

const KN = layerBounds;
const EDGE = layerEdges;

export class Random {
	private x: number;
	private y: number;
	private z: number;
	private w: number;

	/**
	 * @param seed the attempt's
	 * @param row sweep number; −1 for what is drawn once per attempt
	 * @param stream which part of the bench draws, so that one never moves another
	 */
	constructor(seed: Seed, row: number, stream: string) {
		const key = `${ENGINE_VERSION}|${typeof seed === 'number' ? 'n' : 's'}${seed}|${row}|${stream}`;
		[this.x, this.y, this.z, this.w] = hash128(key);
		// xor128 stays at zero for ever from a zero state.
		if ((this.x | this.y | this.z | this.w) === 0) this.w = 1;
	}

	/** 32 random bits as a signed integer. Marsaglia's xor128 (J. Stat. Software 8(14), 2003). */
	next(): number {
		const t = this.x ^ (this.x << 11);
		this.x = this.y;
		this.y = this.z;
		this.z = this.w;
		this.w = this.w ^ (this.w >>> 19) ^ t ^ (t >>> 8);
		return this.w;
	}

	/** Uniform in [0, 1), 53 bits. */
	uniform(): number {
		return ((this.next() >>> 5) * 67108864 + (this.next() >>> 6)) / 9007199254740992;
	}

	/** Uniform in (0, 1): safe under a logarithm. */
	open(): number {
		return ((this.next() >>> 5) * 67108864 + (this.next() >>> 6) + 0.5) / 9007199254740992;
	}

	/** Standard exponential, mean 1. */
	exponential(): number {
		return -Math.log(this.open());
	}

	/** Standard normal by the ziggurat (Marsaglia & Tsang, J. Stat. Software 5(8), 2000), 128 layers. */
	normal(): number {
		const bits = this.next();
		const layer = bits & 127;
		// The layer's own bits are cleared from the value, so that the two are independent.
		const value = bits & ~127;
		if ((value < 0 ? -value : value) < KN[layer]) return value * EDGE.width[layer];
		return this.normalSlow(value, layer);
	}

	private normalSlow(value: number, layer: number): number {
		for (;;) {
			if (layer === 0) {
				for (;;) {
					const x = -Math.log(this.open()) / TAIL_START;
					const y = -Math.log(this.open());
					if (y + y > x * x) return value > 0 ? TAIL_START + x : -TAIL_START - x;
				}
			}
			const x = value * EDGE.width[layer];
			const f = EDGE.density;
			if (f[layer] + this.uniform() * (f[layer - 1] - f[layer]) < Math.exp(-0.5 * x * x)) return x;
			const bits = this.next();
			layer = bits & 127;
			value = bits & ~127;
			if (Math.abs(value) < KN[layer]) return value * EDGE.width[layer];
		}
	}

	/** Fills `target` with standard normals: the hot loop of every noise row. */
	fillNormals(target: Float64Array, count: number): void {
		let { x, y, z, w } = this;
		const width = EDGE.width;
		for (let i = 0; i < count; i++) {
			const t = x ^ (x << 11);
			x = y;
			y = z;
			z = w;
			w = w ^ (w >>> 19) ^ t ^ (t >>> 8);
			const layer = w & 127;
			const value = w & ~127;
			if ((value < 0 ? -value : value) < KN[layer]) {
				target[i] = value * width[layer];
			} else {
				this.x = x;
				this.y = y;
				this.z = z;
				this.w = w;
				target[i] = this.normalSlow(value, layer);
				({ x, y, z, w } = this);
			}
		}
		this.x = x;
		this.y = y;
		this.z = z;
		this.w = w;
	}

	/** Gamma of shape `a` > 0, mean `a` (Marsaglia & Tsang, ACM TOMS 26, 363, 2000). */
	gamma(a: number): number {
		if (a < 1) return this.gamma(a + 1) * this.open() ** (1 / a);
		const d = a - 1 / 3;
		const c = 1 / Math.sqrt(9 * d);
		for (;;) {
			const x = this.normal();
			const v = (1 + c * x) ** 3;
			if (v <= 0) continue;
			const u = this.open();
			if (Math.log(u) < 0.5 * x * x + d - d * v + d * Math.log(v)) return d * v;
		}
	}
}
