import { quantity as quantitySchema } from '$lib/schemas/quantity';
import type { WrittenChoice } from '$lib/schemas/questions/choice';
import type { ChoiceQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { filled } from '$lib/server/bench/exercise/filled';
import { isTrue } from '$lib/server/bench/exercise/truthful';
import { truth } from '$lib/server/bench/truth/truth';
import type { Draw } from '../question-type';
import { fillConditions } from '../set-up/fill-conditions';
import { optionKey, shuffled } from './option-keys';

/** @throws ExerciseError when not one option is right, where one is to be chosen, or none at all */
export function fillChoice(
	written: WrittenChoice,
	{ scene, scope, seed }: Draw,
	field: string
): ChoiceQuestion {
	const { id, pick, inOrder, looked } = written;
	const truths = Object.fromEntries(
		Object.entries(written.truths).map(([name, quantity]) => [
			name,
			truth(scene, filled(quantitySchema, quantity, scope, `${field}.truths.${name}`)).value
		])
	);
	const options = written.options.map((option, i) => ({
		...option,
		text: fillText(option.text, scope, `${field}.options[${i}].text`),
		right: isTrue(option.right, { ...scope, ...truths }, `${field}.options[${i}].right`)
	}));
	const right = options.filter((option) => option.right).length;
	if (right === 0 || (pick === 'one' && right !== 1)) {
		const asked = pick === 'one' ? 'exactly one must be right' : 'at least one must be right';
		throw new ExerciseError([
			{ field: `${field}.options`, message: `${asked} on every draw; here ${right} are` }
		]);
	}
	return {
		type: 'choice',
		id,
		text: fillText(written.text, scope, `${field}.text`),
		pick,
		options: (inOrder ? options : shuffled(options, seed, id)).map((option, i) => ({
			...option,
			key: optionKey(i)
		})),
		looked: looked.map(({ conditions, missing }, i) => ({
			conditions: fillConditions(conditions, scope, `${field}.looked[${i}].conditions`),
			missing
		}))
	};
}
