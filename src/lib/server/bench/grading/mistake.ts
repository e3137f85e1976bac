/**
 * A mistake: what someone making it would report, how to tell from the log whether it was made, how to say so,
 * and how to make it on the bench. One file a kind in mistakes/, listed in mistakes/registry.ts.
 */
import type { z } from 'zod';
import type { ResolvedSettings } from '$lib/schemas/settings';
import type { DrawnExercise, NumberQuestion, FilledStep } from '../exercise/drawn-exercise';
import { ExerciseError } from '../exercise/exercise-error';
import { issuesOf } from '../exercise/zod-issues';
import type { Source } from './evidence';
import type { Family } from './family';

export interface Context {
	drawn: DrawnExercise;
	question: NumberQuestion;
}

/** How the receiver stood for a reading: the trace it was taken from and the rows swept. */
export interface SetUp {
	resolved: ResolvedSettings;
	trace: ResolvedSettings['traces'][number];
	sweeps: number;
}

/**
 * The number that theory says the mistake gives at the reference plane, lead accounted for, and its standard deviation:
 * with a receiver that has no level error of its own (all numbers of one attempt share that).
 */
export interface Prediction {
	value: number;
	spread: number;
}

/** What an explanation is made of: the learner's own numbers. */
export interface Facts extends Context {
	/** The reading the mistake was made with, when one was taken. */
	source?: Source;
	setUp?: SetUp;
	/** What was answered. */
	yours: number;
	/** How much of the way from yours to the truth this mistake accounts for, in the question's unit. */
	change: number;
}

export interface Explanation {
	/** "A point is not a power" */
	title: string;
	text: string;
	sum?: string;
	note?: string;
	/** Words at the ladder's step: "the lead, not added back". */
	part: string;
	/** What was wrong with which step of the log. */
	bad: { at: 'set-up' | 'reading' | 'answer'; text: string };
}

interface Words {
	/** On the number line: "one point". */
	label: string;
	/** After "You": "read one point of the hump". */
	phrase: string;
	explain(facts: Facts): Explanation;
	/** The method with this mistake in it: settings, readings or arithmetic as someone making it would do them. */
	make(steps: readonly FilledStep[], context: Context): FilledStep[];
}

/** Made with the receiver: the reading taken shows whether. */
export interface ReadingMistake extends Words {
	stage: 'reading';
	/** What it can be made with, as kinds of reading or whole families of them; whoever took others didn't make it. */
	families: readonly Family[] | 'all';
	shows(source: Source, context: Context): boolean;
	/** What is reported from that reading, at the reference plane; absent: the reading itself. */
	fromReading?(source: Source, context: Context): number;
	/** Null when it can't be made with that set-up. */
	predict(context: Context, setUp: SetUp): Prediction | null;
}

/** Whether a reading is of the kinds that a mistake is made with. */
export const isMadeWith = ({ families }: ReadingMistake, { family, request }: Source): boolean =>
	families === 'all' || families.includes(family) || families.includes(request.kind);

/** Made after a right reading, with correction or pencil: a change of the number that follows from set-up and reading, in the question's unit. */
export interface Slip extends Words {
	stage: 'slip';
	/**
	 * Null when it can't be made with that set-up: no pad, no pad left out.
	 * @param source the reading it was made with, where one was taken
	 */
	change(context: Context, setUp?: SetUp, source?: Source): number | null;
	/** What is given for a right number, where that isn't the number and the change: half of it, twice it. */
	given?(value: number, context: Context): number;
	/** Standard deviation of that change, where theory gives it and no reading; absent: none worth counting. */
	spread?(context: Context, setUp: SetUp): number;
}

export type Mistake = ReadingMistake | Slip;

export interface MistakeKind {
	kind: string;
	/** @throws ExerciseError naming the parameter at fault */
	bind(fields: unknown, field: string): Mistake;
}

/** A kind of mistake from its parameters' schema and what it does with them. */
export function defineMistake<P>(
	kind: string,
	parameters: z.ZodType<P>,
	bound: (parameters: P) => Mistake
): MistakeKind {
	return {
		kind,
		bind(fields, field) {
			const parsed = parameters.safeParse(fields);
			if (!parsed.success) throw new ExerciseError(issuesOf(parsed.error, field));
			return bound(parsed.data);
		}
	};
}
