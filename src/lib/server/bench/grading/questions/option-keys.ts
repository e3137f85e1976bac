import { Random, type Seed } from '$lib/server/bench/receiver/random';

/** The letter of the option offered at place `i`, from 0. */
export const optionKey = (i: number): string => String.fromCharCode('a'.charCodeAt(0) + i);

/** The same things in an order drawn from the seed, each question with a stream of its own (Fisher and Yates). */
export function shuffled<T>(things: readonly T[], seed: Seed, question: string): T[] {
	const random = new Random(seed, -1, `options/${question}`);
	const order = [...things];
	for (let i = order.length - 1; i > 0; i--) {
		const j = Math.floor((i + 1) * random.uniform());
		[order[i], order[j]] = [order[j], order[i]];
	}
	return order;
}
