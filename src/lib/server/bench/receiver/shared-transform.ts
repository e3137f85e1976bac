import FFT from 'fft.js';

/** A Fourier transform with room to work in: two arrays of complex pairs, anybody's until the next who asks. */
export interface SharedTransform {
	fft: FFT;
	signal: number[];
	spectrum: number[];
}

const made = new Map<number, SharedTransform>();

/** The transform of a size, a power of two: its tables are the same for everybody. */
export function sharedTransform(size: number): SharedTransform {
	const known = made.get(size);
	if (known) return known;
	const fft = new FFT(size);
	const one = { fft, signal: fft.createComplexArray(), spectrum: fft.createComplexArray() };
	made.set(size, one);
	return one;
}
