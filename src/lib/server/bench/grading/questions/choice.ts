/** Asks to choose one or several of the options offered. */
import type { TypedAs } from '$lib/schemas/answer';
import type { WrittenChoice } from '$lib/schemas/questions/choice';
import type { ChoiceAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { ChoiceQuestion, FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import { isTrue } from '$lib/server/bench/exercise/truthful';
import { checkChoice, checkChosen } from './choice/check';
import { fillChoice } from './choice/fill';
import { judgeChoice } from './choice/judge';
import { optionKey } from './option-keys';
import type { QuestionType, Read, WrongWay } from './question-type';

export const choice: QuestionType<'choice'> = {
	check: checkChoice,
	checkAnswer: checkChosen,
	fill: fillChoice,
	fillAnswer(step, { options }, scope, field) {
		const chosen = Object.entries(step.chosen ?? {});
		return {
			gives: ({ values }) => {
				const ids = chosen
					.filter(([id, stated]) => isTrue(stated, { ...scope, ...values }, `${field}.chosen.${id}`))
					.map(([id]) => id);
				return { chosen: options.filter(({ id }) => ids.includes(id)).map(({ key }) => key) };
			}
		};
	},
	read: readChoice,
	words: ({ options }, given) => {
		const { chosen } = given as ChoiceAnswer;
		return options
			.filter(({ key }) => chosen.includes(key))
			.map(({ text }) => `“${text}”`)
			.join(', ');
	},
	judge: judgeChoice,
	wrongWays: (_, question) => wrongChoices(question)
};

function readChoice({ options, pick }: WrittenChoice, typed: TypedAs<'choice'>): Read {
	const chosen = [...new Set(typed.chosen)].sort();
	if (chosen.length === 0) return null;
	const offered = options.map((_, i) => optionKey(i));
	const stranger = chosen.find((key) => !offered.includes(key));
	if (stranger) return { issues: [{ field: 'chosen', message: `No option is called ${stranger}.` }] };
	if (pick === 'one' && chosen.length > 1) return { issues: [{ field: 'chosen', message: 'Choose one.' }] };
	return { given: { chosen } };
}

/** Each wrong option chosen: in place of the right one, or beside the right ones; of several, each right one left out. */
function wrongChoices({ id, pick, options }: ChoiceQuestion): WrongWay[] {
	const right = options.filter((option) => option.right).map(({ key }) => key);
	const way = (name: string, chosen: string[]): WrongWay => ({
		id: name,
		make: (steps) =>
			steps.map((step): FilledStep =>
				step.do === 'answer' && step.question === id
					? { do: 'answer', question: id, gives: () => ({ chosen }) }
					: step
			),
		isNamed: ({ mistakes }) => mistakes.length === 1 && mistakes[0].kind === name
	});
	return options.flatMap((option) => {
		if (!option.right)
			return [way(`chose-${option.id}`, pick === 'one' ? [option.key] : [...right, option.key])];
		const rest = right.filter((key) => key !== option.key);
		return pick === 'one' || rest.length === 0 ? [] : [way(`left-out-${option.id}`, rest)];
	});
}
