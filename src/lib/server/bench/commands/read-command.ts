import { takeReading } from '$lib/measure/take-reading';
import { countInput, readInput } from '$lib/schemas/bench-command';
import { countFrequency } from '../receiver/count';
import { resolveSettings } from '../receiver/resolve-settings';
import { prepareSweep } from '../receiver/sweep';
import { parseInput } from './parse-input';
import { profileOf } from './sweep-command';

/** `read`: a reading off a trace, or a frequency count on the bench (which takes the input of `sweep`). @throws BenchError by field */
export function readCommand(input: unknown) {
	if (isCount(input)) return countCommand(input);
	const { trace, reading } = parseInput(readInput, input);
	return takeReading(trace, reading);
}

const isCount = (input: unknown): boolean =>
	(input as { reading?: { kind?: unknown } } | null)?.reading?.kind === 'count';

function countCommand(input: unknown) {
	const { scene, receiver, settings, seed, sweeps, reading } = parseInput(countInput, input);
	const profile = profileOf(receiver);
	const resolved = resolveSettings(settings, profile);
	const plan = prepareSweep(scene, profile, resolved, seed);
	let clockS = 0;
	for (let n = 0; n < sweeps; n++) clockS += plan.durationS(n);
	return countFrequency(scene, profile, resolved, seed, reading, sweeps, clockS);
}
