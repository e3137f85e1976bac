/** A server for tests of the bench's state: each method does what the test says, and fails when it says nothing. */
import type { BenchWire } from '$lib/components/bench/state/bench-wire';

const unasked = () => Promise.reject(new Error('the test does not expect this request'));

export const wireOf = (does: Partial<BenchWire>): BenchWire => ({
	sweeps: unasked,
	rows: unasked,
	acknowledge: unasked,
	takeReading: unasked,
	saveDrafts: unasked,
	saveMarkings: unasked,
	nextHint: unasked,
	handIn: unasked,
	reload: unasked,
	...does
});

/** A promise that the test settles. */
export function waiting<T>(): { promise: Promise<T>; resolve: (value: T) => void } {
	let resolve: (value: T) => void = () => {};
	const promise = new Promise<T>((settle) => (resolve = settle));
	return { promise, resolve };
}
