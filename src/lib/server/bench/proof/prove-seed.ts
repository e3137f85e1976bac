import type { Exercise } from '$lib/schemas/exercise';
import { BenchError } from '../bench-error';
import type { AttemptRecord, TakenReading } from '../exercise/attempt-record';
import type { SweepWith } from '../exercise/bench-session';
import { drawExercise } from '../exercise/draw-exercise';
import type { DrawnExercise, DrawnQuestion, FilledStep } from '../exercise/drawn-exercise';
import { runMethod } from '../exercise/run-method';
import { judgeQuestion, type Judgement } from '../grading/judge-question';
import { spreadsBetween } from '../grading/mistakes-apart';
import { greatestOwnError, ownError } from '../grading/own-error';
import { modelSpread } from '../grading/spreads';
import { predictMistake } from '../grading/predict-mistake';
import { watchedMistakes, type Watched } from '../grading/watched-mistakes';
import { sharingSweeps } from '../receiver/sharing-sweeps';
import { memoSweeps } from './memo-sweeps';

/** What one seed says of one way to answer one question. */
export interface Outcome {
	question: string;
	/** A mistake's id; null for the taught method. */
	mistake: string | null;
	/** Answered − true, in the question's unit; null when it could not be done on the bench. */
	error: number | null;
	/** What of the error is not this receiver's own: over the seeds, nothing should be left of it. */
	bias: number;
	/** One standard deviation of the reading answered from; of a mistake, what theory leaves open where that is less. */
	spread: number;
	/** Within the tolerance. */
	passes: boolean;
	/** The finding named this mistake and no other; for the taught method, it found nothing wrong. */
	named: boolean;
	/** Why it could not be done. */
	problem?: string;
}

export interface SeedProof {
	seed: number;
	redraws: number;
	outcomes: Outcome[];
	/** By question: spreads between the two mistakes' outcomes that lie nearest to each other. */
	nearest: { question: string; spreads: number }[];
	/** Tolerances that the receiver's own error and three spreads don't fit into. */
	tooTight: { question: string; least: number }[];
}

/** How a learner may leave things: the reading attached, readings taken but none attached, or no reading at all. */
const EVIDENCE: ((record: AttemptRecord, question: string) => AttemptRecord)[] = [
	(record) => record,
	(record, question) => ({ ...record, answers: { [question]: { value: record.answers[question].value } } }),
	(record, question) => ({
		...record,
		readings: [],
		answers: { [question]: { value: record.answers[question].value } }
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
	question: DrawnQuestion,
	steps: readonly FilledStep[],
	sweepWith: SweepWith,
	leave: (typeof EVIDENCE)[number]
): Attempted | { problem: string } {
	try {
		const { record, evidence } = runMethod(drawn, steps, sweepWith);
		const judgement = judgeQuestion(drawn, question, leave(record, question.id));
		const error = record.answers[question.id].value - question.truth;
		const bias = error - ownError({ drawn, question });
		return { judgement, error, bias, spread: spreadOf(evidence[question.id], question) };
	} catch (cause) {
		if (cause instanceof BenchError) return { problem: `${cause.field}: ${cause.message}` };
		throw cause;
	}
}

/** One standard deviation of what was answered from, in the question's unit. */
function spreadOf({ reading }: TakenReading, question: DrawnQuestion): number {
	const inDecibels = question.unit.startsWith('dB') && reading.unit.startsWith('dB');
	const its = question.part === undefined ? reading.unit === question.unit : false;
	return inDecibels || its ? reading.spread : modelSpread(question);
}

function outcome(
	question: DrawnQuestion,
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

/** The receiver as it is, each thing that several set-ups have in common made once. */
function sharing({ scene, profile, seed }: DrawnExercise): SweepWith {
	const prepare = sharingSweeps(scene, profile, seed);
	return (_scene, _profile, resolved) => prepare(resolved);
}

/**
 * Does the taught method and makes every mistake, with one seed, on the bench.
 * @param sweepWith the receiver with a fault planted in it; absent: as it is
 */
export function proveSeed(exercise: Exercise, seed: number, sweepWith?: SweepWith): SeedProof {
	const drawn = drawExercise(exercise, seed);
	const sweeps = memoSweeps(sweepWith ?? sharing(drawn));
	const leave = EVIDENCE[seed % EVIDENCE.length];
	const proof: SeedProof = { seed, redraws: drawn.redraws, outcomes: [], nearest: [], tooTight: [] };
	for (const question of drawn.questions) {
		const taught = outcome(question, null, attempt(drawn, question, drawn.method, sweeps, EVIDENCE[0]));
		const made = watchedMistakes(question).map((watched) => {
			const steps = watched.mistake.make(drawn.method, { drawn, question });
			const done = outcome(question, watched, attempt(drawn, question, steps, sweeps, leave));
			// A reading taken badly may not know how sure it is (a line swept too fast looks like noise); theory knows.
			const predicted = predictMistake(watched, { drawn, question });
			return { ...done, spread: Math.min(done.spread, predicted?.spread ?? Infinity) };
		});
		proof.outcomes.push(taught, ...made);
		proof.nearest.push({ question: question.id, spreads: nearestSpreads(made) });
		const greatest = greatestOwnError({ drawn, question });
		const least = greatest + 3 * taught.spread;
		if (greatest > 0 && question.tolerance < least) {
			proof.tooTight.push({ question: question.id, least });
		}
	}
	return proof;
}

function nearestSpreads(outcomes: readonly Outcome[]): number {
	const made = outcomes.flatMap(({ error, spread }) => (error === null ? [] : [{ value: error, spread }]));
	let nearest = Infinity;
	made.forEach((a, i) => {
		for (const b of made.slice(i + 1)) nearest = Math.min(nearest, spreadsBetween(a, b));
	});
	return nearest;
}
