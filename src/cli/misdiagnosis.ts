/**
 * `npm run misdiagnosis -- [EXERCISE] [--answers N]`: how often the grader names the mistake that was made, over answers made
 * on the bench as people make them. Progress on stderr, tables and one line that sums them up on stdout. All cores work at it.
 */
import { parseArgs } from 'node:util';
import { BenchError } from '$lib/server/bench/bench-error';
import type { MadeAnswer } from '$lib/server/bench/proof/misdiagnosis/made-answer';
import {
	misdiagnosisTable,
	type MisdiagnosisTable
} from '$lib/server/bench/proof/misdiagnosis/misdiagnosis-table';
import { askedExercises, wholeNumber, type AskedExercise } from './asked-exercises';
import { runTasks, TaskFault } from './parallel/run-tasks';
import type { MisdiagnosisTask } from './parallel/task';
import { printMisdiagnosis } from './print-misdiagnosis';
import { progressOf } from './progress';

const BAD_INPUT = 2;
const DEFAULT_ANSWERS = 1000;
const BATCH = 20;
/** One answer in five is made without a mistake; N is how many are wrong. */
const WITH_RIGHT_ONES = 5 / 4;
const USAGE = 'misdiagnosis [EXERCISE] [--answers N] [--from-answer K]';

async function main(args: string[]): Promise<number> {
	const startedAt = performance.now();
	try {
		const { exercises, answers, fromAnswer } = parse(args);
		const tables = await diagnose(exercises, Math.ceil(answers * WITH_RIGHT_ONES), fromAnswer);
		process.stdout.write(tables.map(printMisdiagnosis).join('\n'));
		process.stdout.write(summary(tables, (performance.now() - startedAt) / 1000));
		return tables.every(({ passed }) => passed) ? 0 : 1;
	} catch (error) {
		if (!(error instanceof BenchError || (error instanceof TaskFault && error.field !== undefined)))
			throw error;
		process.stderr.write(`${error.message.replace(/\s+/g, ' ')}\n`);
		return BAD_INPUT;
	}
}

function parse(args: string[]): { exercises: AskedExercise[]; answers: number; fromAnswer: number } {
	const options = { answers: { type: 'string' }, 'from-answer': { type: 'string' } } as const;
	let parsed;
	try {
		parsed = parseArgs({ args, options, allowPositionals: true });
	} catch (cause) {
		throw new BenchError('arguments', `${(cause as Error).message} ${USAGE}`);
	}
	const { values, positionals } = parsed;
	if (positionals.length > 1)
		throw new BenchError('exercise', `exercise: name one, or none for all. ${USAGE}`);
	return {
		exercises: askedExercises(positionals.at(0)).filter(asksNumbers),
		answers: wholeNumber(values.answers ?? String(DEFAULT_ANSWERS), 'answers', 1, 1_000_000),
		fromAnswer: wholeNumber(values['from-answer'] ?? '0', 'from-answer', 0, 2 ** 40)
	};
}

/** Of numbers alone is it asked which mistake they come from. */
const asksNumbers = ({ exercise }: AskedExercise): boolean =>
	exercise.questions.some(({ type }) => type === 'number');

async function diagnose(
	exercises: AskedExercise[],
	answers: number,
	fromAnswer: number
): Promise<MisdiagnosisTable[]> {
	const tasks = exercises.flatMap(({ file }) =>
		Array.from({ length: Math.ceil(answers / BATCH) }, (_, i): MisdiagnosisTask => {
			const first = i * BATCH;
			return {
				do: 'misdiagnose',
				file,
				fromAnswer: fromAnswer + first,
				answers: Math.min(BATCH, answers - first)
			};
		})
	);
	const report = progressOf(answers * exercises.length, 'answers');
	const results: MadeAnswer[][] = [];
	let done = 0;
	await runTasks(tasks, (index, result) => {
		results[index] = result;
		done += result.length;
		report(done);
	});
	return exercises.map(({ file, exercise }) =>
		misdiagnosisTable(exercise.slug, results.filter((_, i) => tasks[i].file === file).flat())
	);
}

function summary(tables: MisdiagnosisTable[], tookS: number): string {
	const sum = (of: (table: MisdiagnosisTable) => number) =>
		tables.reduce((total, table) => total + of(table), 0);
	const wrong = sum(({ wrongAnswers }) => wrongAnswers);
	const right = sum(({ rightAnswers }) => rightAnswers);
	const named = sum((table) => table.namedShare * table.wrongAnswers) / Math.max(1, wrong);
	const failed = sum((table) => table.rightMarkedWrong * table.rightAnswers) / Math.max(1, right);
	const failing = tables.filter(({ passed }) => !passed).map(({ exercise }) => exercise);
	const not = failing.length > 0 ? `; fails: ${failing.join(', ')}` : '';
	return `\n${(100 * named).toFixed(1)} % of ${wrong} wrong answers named rightly, ${(100 * failed).toFixed(1)} % of ${right} right ones marked wrong, ${tables.length} exercises in ${tookS.toFixed(0)} s${not}\n`;
}

process.exitCode = await main(process.argv.slice(2));
