import { BenchError } from '../bench-error';
import { numberAnswers, type AttemptRecord, type TakenReading } from '../exercise/attempt-record';
import type { SweepWith } from '../exercise/bench-session';
import type { DrawnExercise, FilledStep, NumberQuestion } from '../exercise/drawn-exercise';
import { runMethod } from '../exercise/run-method';
import { judgeQuestion, type Judgement } from '../grading/judge-question';
import { spreadsBetween } from '../grading/mistakes-apart';
import { greatestOwnError, ownError } from '../grading/own-error';
import { modelSpread } from '../grading/spreads';
import { predictMistake } from '../grading/predict-mistake';
import { watchedMistakes, type Watched } from '../grading/watched-mistakes';
import type { Outcome, QuestionProof } from './outcome';

/** How a learner may leave things: the reading attached, readings taken but none attached, or no reading at all. */
const EVIDENCE: ((record: AttemptRecord, question: string) => AttemptRecord)[] = [
	(record) => record,
	(record, question) => ({
		...record,
		answers: { [question]: { value: numberAnswers(record)[question].value } }
	}),
	(record, question) => ({
		...record,
		readings: [],
		answers: { [question]: { value: numberAnswers(record)[question].value } }
	})
];

interface Attempted {
	judgement: Judgement;
	error: number;
	bias: number;
	spread: number;
}

function attempt(
	drawn: DrawnExercise,
	question: NumberQuestion,
	steps: readonly FilledStep[],
	sweepWith: SweepWith,
	leave: (typeof EVIDENCE)[number]
): Attempted | { problem: string } {
	try {
		const { record, evidence } = runMethod(drawn, steps, sweepWith);
		const judgement = judgeQuestion(drawn, question, leave(record, question.id));
		const error = numberAnswers(record)[question.id].value - question.truth;
		const bias = error - ownError({ drawn, question });
		return { judgement, error, bias, spread: spreadOf(evidence[question.id], question) };
	} catch (cause) {
		if (cause instanceof BenchError) return { problem: `${cause.field}: ${cause.message}` };
		throw cause;
	}
}

/** One standard deviation of what was answered from, in the question's unit. */
function spreadOf({ reading }: TakenReading, question: NumberQuestion): number {
	const inDecibels = question.unit.startsWith('dB') && reading.unit.startsWith('dB');
	const its = question.part === undefined ? reading.unit === question.unit : false;
	return inDecibels || its ? reading.spread : modelSpread(question);
}

function outcome(
	question: NumberQuestion,
	watched: Watched | null,
	tried: ReturnType<typeof attempt>
): Outcome {
	const base = { question: question.id, mistake: watched?.id ?? null };
	if ('problem' in tried) {
		return { ...base, error: null, bias: 0, spread: 0, passes: false, named: false, problem: tried.problem };
	}
	const { judgement, error, bias, spread } = tried;
	const found = judgement.matched?.watched.map(({ id }) => id) ?? [];
	const named = watched ? found.length === 1 && found[0] === watched.id : judgement.verdict === 'right';
	return { ...base, error, bias, spread, passes: Math.abs(error) <= question.tolerance, named };
}

/** Answers a question that asks for a number, as taught and with each of its mistakes. */
export function proveNumber(
	drawn: DrawnExercise,
	question: NumberQuestion,
	seed: number,
	sweeps: SweepWith
): QuestionProof {
	const leave = EVIDENCE[seed % EVIDENCE.length];
	const taught = outcome(question, null, attempt(drawn, question, drawn.method, sweeps, EVIDENCE[0]));
	const made = watchedMistakes(question).map((watched) => {
		const steps = watched.mistake.make(drawn.method, { drawn, question });
		const done = outcome(question, watched, attempt(drawn, question, steps, sweeps, leave));
		// A reading taken badly may not know how sure it is (a line swept too fast looks like noise); theory knows.
		const predicted = predictMistake(watched, { drawn, question });
		return { ...done, spread: Math.min(done.spread, predicted?.spread ?? Infinity) };
	});
	const greatest = greatestOwnError({ drawn, question });
	const least = greatest + 3 * taught.spread;
	return {
		outcomes: [taught, ...made],
		nearest: [{ question: question.id, spreads: nearestSpreads(made) }],
		tooTight: greatest > 0 && question.tolerance < least ? [{ question: question.id, least }] : []
	};
}

function nearestSpreads(outcomes: readonly Outcome[]): number {
	const made = outcomes.flatMap(({ error, spread }) => (error === null ? [] : [{ value: error, spread }]));
	let nearest = Infinity;
	made.forEach((a, i) => {
		for (const b of made.slice(i + 1)) nearest = Math.min(nearest, spreadsBetween(a, b));
	});
	return nearest;
}
