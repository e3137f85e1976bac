/**
 * A type of question: how it is checked, drawn, read, judged and proven. One file a type beside this one, listed in registry.ts.
 * What is typed stands in schemas/answer.ts, what is shown in schemas/questions/view.ts, what is found in …/finding.ts.
 */
import type { TypedAs } from '$lib/schemas/answer';
import type { Exercise, MethodStep } from '$lib/schemas/exercise';
import type { QuestionFinding } from '$lib/schemas/questions/finding';
import type { QuestionAs, QuestionTypeName } from '$lib/schemas/questions/question';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Scene } from '$lib/schemas/scene';
import type { AttemptRecord, GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnAs, DrawnExercise, FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import type { Scope } from '$lib/server/bench/exercise/expression';
import type { Seed } from '$lib/server/bench/receiver/random';

/** What a question is filled in from. */
export interface Draw {
	scene: Scene;
	scope: Scope;
	seed: Seed;
	profile: ReceiverProfile;
}
export type AnswerStep = Extract<MethodStep, { do: 'answer' }>;
/** What of an answer step the type of its question says. */
export type Answering =
	| { value: (scope: Scope) => number; reading: string }
	| Pick<Extract<FilledStep, { gives: unknown }>, 'gives'>;

/** What was typed, understood: null where nothing was, else the answer or why it is none, by field within the answer. */
export type Read = null | { given: GivenAnswer } | { issues: { field: string; message: string }[] };

/** What was wrong with a step of the log, said at that step: a set-up, a reading, or the answer itself. */
export interface Blame {
	entry?: number;
	reading?: string;
	question?: string;
	text: string;
}
export interface Judged {
	finding: QuestionFinding;
	blames: Blame[];
}

/** A wrong way to answer, as a proof makes it on the bench. */
export interface WrongWay {
	id: string;
	make(steps: readonly FilledStep[]): FilledStep[];
	/** Whether the finding names this mistake and no other. */
	isNamed(finding: QuestionFinding): boolean;
}

export interface QuestionType<T extends QuestionTypeName> {
	/** What no schema can say of a question as written. */
	check(written: QuestionAs<T>, field: string, exercise: Exercise): ExerciseIssue[];
	/** Whether the taught method says what this type needs to be answered. */
	checkAnswer(step: AnswerStep, written: QuestionAs<T>, field: string): ExerciseIssue[];
	/** @throws ExerciseError by field when a draw doesn't come out valid */
	fill(written: QuestionAs<T>, draw: Draw, field: string): DrawnAs<T>;
	fillAnswer(step: AnswerStep, question: DrawnAs<T>, scope: Scope, field: string): Answering;
	read(written: QuestionAs<T>, typed: TypedAs<T>): Read;
	/** An answer in words: "−47.2 dBm", "“Both of them”". */
	words(question: DrawnAs<T>, given: GivenAnswer): string;
	/** Pure: the same record always gets the same judgement. */
	judge(drawn: DrawnExercise, question: DrawnAs<T>, record: AttemptRecord): Judged;
	/** Those that can be made on this draw; numbers have a proof of their own. */
	wrongWays(drawn: DrawnExercise, question: DrawnAs<T>): WrongWay[];
}
