/**
 * Check vectors: what the command line's `sweep` must give, from brute-force simulation or theory made outside this project
 * (each expectation names which). Tolerances hold for any seed of correct code, so each file runs with its own seed and one more.
 */
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { sweepCommand } from '$lib/server/bench/commands/sweep-command';
import { statistic, type Expectation } from './statistics';

interface Vector {
	name: string;
	input: { seed: number };
	expect: Expectation[];
}

const folder = new URL('./vectors/', import.meta.url);
const vectors = readdirSync(folder)
	.filter((file) => file.endsWith('.json'))
	.map((file) => JSON.parse(readFileSync(new URL(file, folder), 'utf8')) as Vector);

describe.each(vectors)('vector $name', ({ input, expect: expectations }) => {
	it.each([input.seed, 2026])('holds with seed %d', (seed) => {
		const result = sweepCommand({ ...input, seed });
		for (const expected of expectations) {
			const where = `${expected.stat} ${expected.fromHz ?? ''} from ${expected.from}`;
			expect(Math.abs(statistic(result, expected) - expected.value), where).toBeLessThanOrEqual(
				expected.tolerance
			);
		}
	});
});
