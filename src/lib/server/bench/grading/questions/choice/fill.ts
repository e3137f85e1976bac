import type { WrittenChoice } from '$lib/schemas/questions/choice';
import type { ChoiceQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { isTrue } from '$lib/server/bench/exercise/truthful';
import { withTruths } from '../fill-truths';
import type { Draw } from '../question-type';
import { fillConditions } from '../set-up/fill-conditions';
import { optionKey, shuffled } from '../option-keys';

/** @throws ExerciseError when not one option is right, where one is to be chosen, or none at all */
export function fillChoice(written: WrittenChoice, draw: Draw, field: string): ChoiceQuestion {
	const { id, pick, inOrder, looked } = written;
	const { scope, seed } = draw;
	const known = withTruths(written.truths, draw, field);
	const options = written.options.map((option, i) => ({
		...option,
		text: fillText(option.text, scope, `${field}.options[${i}].text`),
		right: isTrue(option.right, known, `${field}.options[${i}].right`)
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
