import type { Exercise } from '$lib/schemas/exercise';
import type { ProofQuestion, ProofResult, ProofRow } from '$lib/schemas/proof-view';
import { drawExercise } from '../exercise/draw-exercise';
import { watchedMistakes } from '../grading/watched-mistakes';
import { adviseOn } from './advise';
import { LIMITS } from './proof-table';
import { tableOf } from './prove-exercise';
import type { SeedProof } from './prove-seed';

/** Figures of an error worth keeping: they are drawn, and tolerances are sought among them. */
const FIGURES = 6;

/** What proofs of seeds from `fromSeed` upwards, in order, say together, with each seed's error and what to do about failures. */
export function proofResult(exercise: Exercise, fromSeed: number, proofs: readonly SeedProof[]): ProofResult {
	const table = tableOf(exercise, fromSeed, proofs);
	const drawn = drawExercise(exercise, fromSeed);
	const labels = new Map(
		drawn.questions.flatMap((question) =>
			watchedMistakes(question).map(({ id, mistake }) => [`${question.id}|${id}`, mistake.label])
		)
	);
	const questions = drawn.questions.map(({ id, text, unit, digits, tolerance }, i): ProofQuestion => ({
		...{ id, text, unit, digits, tolerance },
		absolute: 'absolute' in exercise.questions[i].tolerance
	}));
	const rows = table.rows.map(({ question, mistake, passShare, scatter, failures }): ProofRow => ({
		question,
		mistake,
		label: mistake === null ? 'Taught method' : (labels.get(`${question}|${mistake}`) ?? mistake),
		passShare,
		limit: mistake === null ? LIMITS.taughtPasses : LIMITS.mistakePasses,
		errors: proofs.map(({ outcomes }) => {
			const outcome = outcomes.find((one) => one.question === question && one.mistake === mistake);
			return outcome?.error == null ? null : Number(outcome.error.toPrecision(FIGURES));
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
