import type { Exercise } from '$lib/schemas/exercise';
import type { ProofQuestion, ProofResult, ProofRow } from '$lib/schemas/proof-view';
import type { ExerciseQuestion } from '$lib/schemas/questions/question';
import { drawExercise } from '../exercise/draw-exercise';
import { numberQuestions, type DrawnQuestion } from '../exercise/drawn-exercise';
import { watchedMistakes } from '../grading/watched-mistakes';
import { adviseOn } from './advise';
import { LIMITS } from './proof-table';
import type { Outcome } from './outcome';
import { tableOf } from './prove-exercise';
import type { SeedProof } from './prove-seed';

/** Figures of an error worth keeping: they are drawn, and tolerances are sought among them. */
const FIGURES = 6;

/** Right and wrong as figures, of what is no number. */
const [RIGHT, WRONG] = [0, 1];

function proofQuestion(question: DrawnQuestion, written: ExerciseQuestion): ProofQuestion {
	const { id, text, type } = question;
	if (question.type !== 'number' || written.type !== 'number')
		return { id, text, type, unit: '1', digits: 0, tolerance: (RIGHT + WRONG) / 2, absolute: false };
	const { unit, digits, tolerance } = question;
	return { id, text, type, unit, digits, tolerance, absolute: 'absolute' in written.tolerance };
}

function errorOf({ error, passes, problem }: Outcome): number | null {
	if (error !== null) return Number(error.toPrecision(FIGURES));
	return problem === undefined ? (passes ? RIGHT : WRONG) : null;
}

/** What proofs of seeds from `fromSeed` upwards, in order, say together, with each seed's error and what to do about failures. */
export function proofResult(exercise: Exercise, fromSeed: number, proofs: readonly SeedProof[]): ProofResult {
	const table = tableOf(exercise, fromSeed, proofs);
	const drawn = drawExercise(exercise, fromSeed);
	const labels = new Map(
		numberQuestions(drawn).flatMap((question) =>
			watchedMistakes(question).map(({ id, mistake }) => [`${question.id}|${id}`, mistake.label])
		)
	);
	const questions = drawn.questions.map((question, i) => proofQuestion(question, exercise.questions[i]));
	const rows = table.rows.map(({ question, mistake, passShare, scatter, failures }): ProofRow => ({
		question,
		mistake,
		label: mistake === null ? 'Taught method' : (labels.get(`${question}|${mistake}`) ?? mistake),
		passShare,
		limit: mistake === null ? LIMITS.taughtPasses : LIMITS.mistakePasses,
		errors: proofs.map(({ outcomes }) => {
			const outcome = outcomes.find((one) => one.question === question && one.mistake === mistake);
			return outcome ? errorOf(outcome) : null;
		}),
		scatter,
		failures
	}));
	return {
		fromSeed,
		seeds: table.seeds,
		passed: table.passed,
		questions,
		rows,
		failures: table.failures,
		advice: adviseOn(questions, rows, table)
	};
}
