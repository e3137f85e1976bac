/** Every type of question, and the one door to each thing that a type decides. */
import type { TypedAnswer } from '$lib/schemas/answer';
import type { Exercise } from '$lib/schemas/exercise';
import type { ExerciseQuestion, QuestionTypeName } from '$lib/schemas/questions/question';
import type { AttemptRecord, GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnExercise, DrawnQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import type { ExerciseIssue } from '$lib/server/bench/exercise/exercise-error';
import type { Scope } from '$lib/server/bench/exercise/expression';
import { choice } from './choice';
import { emissions } from './emissions';
import { mark } from './mark';
import { number } from './number';
import { order } from './order';
import type { Answering, AnswerStep, Draw, Judged, QuestionType, Read, WrongWay } from './question-type';
import { setUp } from './set-up';
import { uncertainty } from './uncertainty';

const types: { [T in QuestionTypeName]: QuestionType<T> } = {
	number,
	choice,
	'set-up': setUp,
	mark,
	order,
	emissions,
	uncertainty
};

/** A question's own type. A question is only ever given to that, so one type stands here for whichever it is. */
const typeOf = ({ type }: { type: QuestionTypeName }): QuestionType<'number'> =>
	types[type] as unknown as QuestionType<'number'>;
type Written = Extract<ExerciseQuestion, { type: 'number' }>;
type Drawn = Extract<DrawnQuestion, { type: 'number' }>;

export const checkQuestion = (
	written: ExerciseQuestion,
	field: string,
	exercise: Exercise
): ExerciseIssue[] => typeOf(written).check(written as Written, field, exercise);

export const checkAnswer = (written: ExerciseQuestion, step: AnswerStep, field: string): ExerciseIssue[] =>
	typeOf(written).checkAnswer(step, written as Written, field);

export const fillQuestion = (written: ExerciseQuestion, draw: Draw, field: string): DrawnQuestion =>
	typeOf(written).fill(written as Written, draw, field);

export const fillAnswer = (
	question: DrawnQuestion,
	step: AnswerStep,
	scope: Scope,
	field: string
): Answering => typeOf(question).fillAnswer(step, question as Drawn, scope, field);

/** What a typed answer says; one of another type than the question's is refused. */
export function readAnswer(written: ExerciseQuestion, typed: TypedAnswer): Read {
	if (typed.type !== written.type) {
		return {
			issues: [{ field: 'type', message: `This question takes a ${written.type}, not a ${typed.type}.` }]
		};
	}
	return typeOf(written).read(written as Written, typed as Extract<TypedAnswer, { type: 'number' }>);
}

/** An answer in words. */
export const answerWords = (question: DrawnQuestion, given: GivenAnswer): string =>
	typeOf(question).words(question as Drawn, given);

/** What one question's answer is worth, and why. */
export const judge = (drawn: DrawnExercise, question: DrawnQuestion, record: AttemptRecord): Judged =>
	typeOf(question).judge(drawn, question as Drawn, record);

export const wrongWays = (drawn: DrawnExercise, question: DrawnQuestion): WrongWay[] =>
	typeOf(question).wrongWays(drawn, question as Drawn);
