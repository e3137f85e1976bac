/** A mistake watched on a question of content/, made on the bench with one seed, beside what theory says of it. */
import { numberAnswers, type AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { numberQuestions, type DrawnExercise } from '$lib/server/bench/exercise/drawn-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { judgeQuestion } from '$lib/server/bench/grading/judge-question';
import { predictMistake } from '$lib/server/bench/grading/predict-mistake';
import { ownError } from '$lib/server/bench/grading/own-error';
import { watchedMistakes } from '$lib/server/bench/grading/watched-mistakes';
import { contentExercise } from './content-exercise';

export const drawnFrom = (slug: string, seed: number): DrawnExercise =>
	drawExercise(contentExercise(slug), seed);

export function madeOnBench(drawn: DrawnExercise, questionId: string, id: string) {
	const question = numberQuestions(drawn).find((one) => one.id === questionId)!;
	const context = { drawn, question };
	const watched = watchedMistakes(question).find((one) => one.id === id)!;
	const { record } = runMethod(drawn, watched.mistake.make(drawn.method, context));
	const { value, readingId } = numberAnswers(record)[questionId];
	const named = (left: AttemptRecord) =>
		judgeQuestion(drawn, question, left).matched?.watched.map((one) => one.id) ?? [];
	const answers = { [questionId]: { value } };
	return {
		question,
		/** What was answered, less this receiver's own error. */
		value: value - ownError(context),
		predicted: predictMistake(watched, context)!,
		/** What the finding names with the reading attached, and from the log alone. */
		named: named({ ...record, answers: { [questionId]: { value, readingId } } }),
		namedFromLog: named({ ...record, readings: [], answers })
	};
}
