import type { Exercise } from '$lib/schemas/exercise';
import { BenchError } from '$lib/server/bench/bench-error';
import { numberAnswers, type AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import {
	numberQuestions,
	type DrawnExercise,
	type NumberQuestion
} from '$lib/server/bench/exercise/drawn-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { judgeQuestion } from '$lib/server/bench/grading/judge-question';
import { watchedMistakes, type Watched } from '$lib/server/bench/grading/watched-mistakes';
import { Random } from '$lib/server/bench/receiver/random';
import { evidences, type EvidenceLeft, type MadeAnswer } from './made-answer';
import { typed } from './typed';
import { byHandOrBench, varyMethod } from './vary-method';

/** Of so many answers in a row, one is right: made without any mistake. */
const ONE_RIGHT_IN = 5;
/** Far from the seeds that proofs use. */
const FIRST_SEED = 1_000_000;
const MOST_TRIES = 4;

/**
 * Answers made on the bench as people make them: a set-up of their own, a reading or a slip of arithmetic, a number as
 * typed, with the reading attached, left unattached, or none taken. Nothing here asks a mistake what it predicts.
 */
export const makeAnswers = (
	exercise: Exercise,
	{ fromAnswer, answers }: { fromAnswer: number; answers: number }
): MadeAnswer[] => Array.from({ length: answers }, (_, i) => makeAnswer(exercise, fromAnswer + i));

function makeAnswer(exercise: Exercise, answer: number): MadeAnswer {
	const random = new Random('misdiagnosis', answer, exercise.slug);
	const drawn = drawExercise(exercise, FIRST_SEED + answer);
	const { question, watched } = whatToDo(drawn, answer);
	const evidence = evidences[Math.floor(evidences.length * random.uniform())];
	const base = { answer, question: question.id, mistake: watched?.id ?? null, evidence };
	let problem = '';
	for (let tries = 0; tries < MOST_TRIES; tries++) {
		try {
			const record = make(drawn, question, watched, evidence, random);
			const { verdict, matched } = judgeQuestion(drawn, question, record);
			return { ...base, verdict, found: matched?.watched.map(({ id }) => id) ?? [] };
		} catch (cause) {
			if (!(cause instanceof BenchError)) throw cause;
			problem = `${cause.field}: ${cause.message}`;
		}
	}
	return { ...base, verdict: null, problem, found: [] };
}

/** Every mistake of every question that asks for a number by turns, and now and then none. */
function whatToDo(
	drawn: DrawnExercise,
	answer: number
): { question: NumberQuestion; watched: Watched | null } {
	const questions = numberQuestions(drawn);
	if (answer % ONE_RIGHT_IN === 0) {
		return { question: questions[(answer / ONE_RIGHT_IN) % questions.length], watched: null };
	}
	const all = questions.flatMap((question) =>
		watchedMistakes(question).map((watched) => ({ question, watched }))
	);
	return all[(answer - Math.ceil(answer / ONE_RIGHT_IN)) % all.length];
}

function make(
	drawn: DrawnExercise,
	question: NumberQuestion,
	watched: Watched | null,
	evidence: EvidenceLeft,
	random: Random
): AttemptRecord {
	const method = byHandOrBench(drawn, question, random);
	const own = { ...drawn, method };
	const made = watched ? watched.mistake.make(method, { drawn: own, question }) : method;
	const { record } = runMethod(own, varyMethod(made, own, question, random, watched === null));
	const { value, readingId } = numberAnswers(record)[question.id];
	const given = { value: typed(value, question, random) };
	const answers = { [question.id]: evidence === 'attached' ? { ...given, readingId } : given };
	return { ...record, readings: evidence === 'no reading' ? [] : record.readings, answers };
}
