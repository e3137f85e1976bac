import { truthInput } from '$lib/schemas/bench-command';
import { truth } from '../truth/truth';
import { parseInput } from './parse-input';

/** `truth`: an exact quantity of a scene. @throws BenchError by field */
export function truthCommand(input: unknown) {
	const { scene, quantity } = parseInput(truthInput, input);
	return truth(scene, quantity);
}
