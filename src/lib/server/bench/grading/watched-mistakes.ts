import type { WatchedMistake } from '$lib/schemas/questions/number';
import type { NumberQuestion } from '../exercise/drawn-exercise';
import { ExerciseError } from '../exercise/exercise-error';
import type { Mistake } from './mistake';
import { mistakeKinds } from './mistakes/registry';

/** A mistake watched on a question, with the name that tables and findings use for it. */
export interface Watched {
	id: string;
	kind: string;
	mistake: Mistake;
}

/** @throws ExerciseError naming the kind or the parameter at fault */
export function bindMistake({ kind, id: _, ...parameters }: WatchedMistake, field: string): Mistake {
	const known = mistakeKinds.find((candidate) => candidate.kind === kind);
	if (!known) {
		const kinds = mistakeKinds.map((candidate) => candidate.kind).join(', ');
		throw new ExerciseError([{ field: `${field}.kind`, message: `must be one of ${kinds}; given ${kind}` }]);
	}
	return known.bind(parameters, field);
}

/**
 * Names a mistake by its kind and parameters as the author wrote them, expressions too ("wrong-width 2000",
 * "coupling-left-out couplingDb"): the same on every seed.
 */
export const mistakeId = ({ kind, id: _, ...parameters }: WatchedMistake): string =>
	[kind, ...Object.values(parameters).map((value) => String(value).replace(/^=/, ''))].join(' ');

/** The mistakes watched on a question. */
export const watchedMistakes = (question: NumberQuestion): Watched[] =>
	question.mistakes.map((watched, i) => ({
		id: typeof watched.id === 'string' ? watched.id : mistakeId(watched),
		kind: watched.kind,
		mistake: bindMistake(watched, `questions.${question.id}.mistakes[${i}]`)
	}));
