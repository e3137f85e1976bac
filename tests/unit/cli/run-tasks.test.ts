import { describe, expect, it } from 'vitest';
import { proveSeeds } from '$lib/server/bench/proof/prove-exercise';
import { runTasks } from '../../../src/cli/parallel/run-tasks';
import type { ProofTask } from '../../../src/cli/parallel/task';
import { contentExercise } from '../../factories/content-exercise';

describe('runTasks(tasks, onDone)', { timeout: 120_000 }, () => {
	const slug = 'power-behind-a-coupler';
	const task = (fromSeed: number): ProofTask => ({
		do: 'prove',
		file: `content/spectrum-measurement/01-connect-safely/${slug}.yaml`,
		fromSeed,
		seeds: 1
	});

	it('gives in workers what is given here, whatever comes first', async () => {
		const results: unknown[] = [];
		await runTasks([1, 2, 3].map(task), (index, result) => (results[index] = result));
		expect(results.flat()).toEqual(proveSeeds(contentExercise(slug), { fromSeed: 1, seeds: 3 }));
	});

	it('passes on what a task threw', async () => {
		const lost = { ...task(1), file: 'content/no-such-file.yaml' };
		await expect(runTasks([lost], () => undefined)).rejects.toThrow('no-such-file.yaml');
	});
});
