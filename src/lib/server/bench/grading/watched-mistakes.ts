import type { WatchedMistake } from '$lib/schemas/exercise';
import type { DrawnQuestion } from '../exercise/drawn-exercise';
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
export function bindMistake({ kind, ...parameters }: WatchedMistake, field: string): Mistake {
	const known = mistakeKinds.find((candidate) => candidate.kind === kind);
	if (!known) {
		const kinds = mistakeKinds.map((candidate) => candidate.kind).join(', ');
		throw new ExerciseError([{ field: `${field}.kind`, message: `must be one of ${kinds}; given ${kind}` }]);
	}
	return known.bind(parameters, field);
}

/** The mistakes watched on a question; a kind watched in several ways has its parameters in its name. */
export const watchedMistakes = ({ id, mistakes }: DrawnQuestion): Watched[] =>
	mistakes.map((watched, i) => {
		const { kind, ...parameters } = watched;
		const values = Object.values(parameters).map(String);
		return {
			id: [kind, ...values].join(' '),
			kind,
			mistake: bindMistake(watched, `questions.${id}.mistakes[${i}]`)
		};
	});
