/** The proof on the command line: progress on stderr, a table and one line that sums it up on stdout. All cores work at it. */
import { parseArgs } from 'node:util';
import { BenchError } from '$lib/server/bench/bench-error';
import { tableOf } from '$lib/server/bench/proof/prove-exercise';
import type { ProofTable } from '$lib/server/bench/proof/proof-table';
import type { SeedProof } from '$lib/server/bench/proof/prove-seed';
import { askedExercises, wholeNumber, type AskedExercise } from './asked-exercises';
import { runTasks, TaskFault } from './parallel/run-tasks';
import type { ProofTask } from './parallel/task';
import { printProof } from './print-proof';
import { progressOf } from './progress';

const BAD_INPUT = 2;
const DEFAULT_SEEDS = 200;
/** Seeds that a worker does at a time. */
const BATCH = 5;
const USAGE =
	'proof [EXERCISE] [--seeds N] [--from-seed K] [--json]   EXERCISE: a slug in content/ or a file';

interface Asked {
	exercises: AskedExercise[];
	seeds: number;
	fromSeed: number;
	json: boolean;
}

/**
 * @param args the words after the verb
 * @returns the exit code: 0 when every exercise asked is proven, 1 when one is not, 2 for bad input
 */
export async function proof(args: string[]): Promise<number> {
	const startedAt = performance.now();
	try {
		const asked = parse(args);
		const tables = await prove(asked);
		if (asked.json) process.stdout.write(`${JSON.stringify(tables)}\n`);
		else process.stdout.write(tables.map(printProof).join('\n'));
		const tookS = (performance.now() - startedAt) / 1000;
		process.stdout.write(asked.json ? '' : summary(tables, asked.seeds, tookS));
		return tables.every(({ passed }) => passed) ? 0 : 1;
	} catch (error) {
		if (!(error instanceof BenchError || (error instanceof TaskFault && error.field !== undefined)))
			throw error;
		process.stderr.write(`${error.message.replace(/\s+/g, ' ')}\n`);
		return BAD_INPUT;
	}
}

function parse(args: string[]): Asked {
	const { values, positionals } = read(args);
	if (positionals.length > 1)
		throw new BenchError('exercise', `exercise: name one, or none for all. ${USAGE}`);
	return {
		exercises: askedExercises(positionals.at(0)),
		seeds: wholeNumber(values.seeds ?? String(DEFAULT_SEEDS), 'seeds', 1, 100_000),
		fromSeed: wholeNumber(values['from-seed'] ?? '1', 'from-seed', 0, 2 ** 52),
		json: values.json ?? false
	};
}

function read(args: string[]) {
	const options = {
		seeds: { type: 'string' },
		'from-seed': { type: 'string' },
		json: { type: 'boolean' }
	} as const;
	try {
		return parseArgs({ args, options, allowPositionals: true });
	} catch (cause) {
		throw new BenchError('arguments', `${(cause as Error).message} ${USAGE}`);
	}
}

async function prove({ exercises, seeds, fromSeed }: Asked): Promise<ProofTable[]> {
	const tasks = exercises.flatMap(({ file }) =>
		Array.from({ length: Math.ceil(seeds / BATCH) }, (_, i): ProofTask => {
			const first = i * BATCH;
			return { do: 'prove', file, fromSeed: fromSeed + first, seeds: Math.min(BATCH, seeds - first) };
		})
	);
	const total = seeds * exercises.length;
	const report = progressOf(
		total,
		exercises.length === 1 ? `seeds of ${exercises[0].exercise.slug}` : 'seeds'
	);
	const results: SeedProof[][] = [];
	let done = 0;
	await runTasks(tasks, (index, result) => {
		results[index] = result;
		done += result.length;
		report(done);
	});
	return exercises.map(({ file, exercise }) => {
		const own = results.filter((_, i) => tasks[i].file === file).flat();
		return tableOf(exercise, fromSeed, own);
	});
}

function summary(tables: ProofTable[], seeds: number, tookS: number): string {
	const proven = tables.filter(({ passed }) => passed).length;
	const noun = tables.length === 1 ? 'exercise' : 'exercises';
	const failing = tables.filter(({ passed }) => !passed).map(({ exercise }) => exercise);
	const not = failing.length > 0 ? `; not proven: ${failing.join(', ')}` : '';
	return `\n${proven} of ${tables.length} ${noun} proven over ${seeds} seeds in ${tookS.toFixed(0)} s${not}\n`;
}
