import type { QuestionFinding } from '$lib/schemas/questions/finding';
import { BenchError } from '../bench-error';
import type { SweepWith } from '../exercise/bench-session';
import type { DrawnExercise, DrawnQuestion, FilledStep } from '../exercise/drawn-exercise';
import { runMethod } from '../exercise/run-method';
import { judge, wrongWays } from '../grading/questions/registry';
import type { Outcome, QuestionProof } from './outcome';

/** Answers a question that asks for no number, as taught and in each wrong way that this draw allows. */
export function proveWays(drawn: DrawnExercise, question: DrawnQuestion, sweeps: SweepWith): QuestionProof {
	const done = (
		mistake: string | null,
		steps: readonly FilledStep[],
		isNamed: (finding: QuestionFinding) => boolean
	): Outcome => {
		const base = { question: question.id, mistake, error: null, bias: 0, spread: 0 };
		try {
			// What comes after the answer changes nothing of it.
			const end = steps.findIndex((step) => step.do === 'answer' && step.question === question.id);
			const { record } = runMethod(drawn, steps.slice(0, end + 1), sweeps);
			const { finding } = judge(drawn, question, record);
			return { ...base, passes: finding.verdict.startsWith('right'), named: isNamed(finding) };
		} catch (cause) {
			if (!(cause instanceof BenchError)) throw cause;
			return { ...base, passes: false, named: false, problem: `${cause.field}: ${cause.message}` };
		}
	};
	const taught = done(null, drawn.method, ({ verdict }) => verdict === 'right');
	const wrong = wrongWays(drawn, question).map(({ id, make, isNamed }) =>
		done(id, make(drawn.method), isNamed)
	);
	return { outcomes: [taught, ...wrong], nearest: [], tooTight: [] };
}
