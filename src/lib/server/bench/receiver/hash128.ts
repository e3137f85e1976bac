/**
 * MurmurHash3 x86_128 (A. Appleby, public domain algorithm) of a string's UTF-16 code units as bytes.
 * Turns a key such as "1|attempt seed|row|stream" into a generator state: neighbouring keys give unrelated states.
 */
export function hash128(key: string): [number, number, number, number] {
	const c1 = 0x239b961b;
	const c2 = 0xab0e9789;
	const c3 = 0x38b34ae5;
	const c4 = 0xa1e38b93;
	let h1 = 0;
	let h2 = 0;
	let h3 = 0;
	let h4 = 0;
	const words = codeWords(key);
	const blocks = words.length >> 2;
	for (let b = 0; b < blocks; b++) {
		h1 ^= mix(words[4 * b], c1, 15, c2);
		h1 = (Math.imul(rotl(h1, 19) + h2, 5) + 0x561ccd1b) | 0;
		h2 ^= mix(words[4 * b + 1], c2, 16, c3);
		h2 = (Math.imul(rotl(h2, 17) + h3, 5) + 0x0bcaa747) | 0;
		h3 ^= mix(words[4 * b + 2], c3, 17, c4);
		h3 = (Math.imul(rotl(h3, 15) + h4, 5) + 0x96cd1c35) | 0;
		h4 ^= mix(words[4 * b + 3], c4, 18, c1);
		h4 = (Math.imul(rotl(h4, 13) + h1, 5) + 0x32ac3b17) | 0;
	}
	const bytes = key.length * 2;
	h1 ^= bytes;
	h2 ^= bytes;
	h3 ^= bytes;
	h4 ^= bytes;
	h1 = (h1 + h2 + h3 + h4) | 0;
	h2 = (h2 + h1) | 0;
	h3 = (h3 + h1) | 0;
	h4 = (h4 + h1) | 0;
	h1 = finish(h1);
	h2 = finish(h2);
	h3 = finish(h3);
	h4 = finish(h4);
	h1 = (h1 + h2 + h3 + h4) | 0;
	h2 = (h2 + h1) | 0;
	h3 = (h3 + h1) | 0;
	h4 = (h4 + h1) | 0;
	return [h1, h2, h3, h4];
}

const rotl = (x: number, r: number): number => (x << r) | (x >>> (32 - r));
const mix = (word: number, a: number, r: number, b: number): number =>
	Math.imul(rotl(Math.imul(word, a), r), b);

function finish(h: number): number {
	h ^= h >>> 16;
	h = Math.imul(h, 0x85ebca6b);
	h ^= h >>> 13;
	h = Math.imul(h, 0xc2b2ae35);
	return h ^ (h >>> 16);
}

/** Code units two to a 32-bit word, little-endian, zero-padded to whole 128-bit blocks (so no tail is needed). */
function codeWords(key: string): Int32Array {
	const words = new Int32Array(4 * Math.ceil(key.length / 8));
	for (let i = 0; i < key.length; i++) words[i >> 1] |= key.charCodeAt(i) << (16 * (i & 1));
	return words;
}
