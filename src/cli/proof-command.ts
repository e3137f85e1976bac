/**
 * The proof on the command line: progress on stderr, a table and one line that sums it up on stdout. All cores work at it; what was
 * proven before, of the same text by the same sources, is not proven again.
 */
import { parseArgs } from 'node:util';
import { BenchError } from '$lib/server/bench/bench-error';
import { tableOf } from '$lib/server/bench/proof/prove-exercise';
import { REPORT_SEEDS } from '$lib/server/bench/proof/proof-report';
import type { ProofTable } from '$lib/server/bench/proof/proof-table';
import { askedExercises, wholeNumber, type AskedExercise } from './asked-exercises';
import { runTasks, TaskFault } from './parallel/run-tasks';
import type { ProofTask } from './parallel/task';
import { printProof } from './print-proof';
import { progressOf } from './progress';
import { ProofCache } from './proofs/proof-cache';
import { reportedName, writeReport } from './proofs/write-report';

const BAD_INPUT = 2;
const DEFAULT_SEEDS = 200;
/** Seeds that a worker does at a time. */
const BATCH = 5;
const USAGE =
	'proof [EXERCISE] [--seeds N] [--from-seed K] [--anew] [--write] [--json]   EXERCISE: a slug in content/ or a file';

interface Asked {
	exercises: AskedExercise[];
	seeds: number;
	fromSeed: number;
	json: boolean;
	/** Whether what was proven before is proven again. */
	anew: boolean;
	/** Whether the report in content/ is brought up to date. */
	write: boolean;
}

/** An exercise's proof, and the processor time it took when it was made, s. */
interface Proven {
	file: string;
	table: ProofTable;
	cpuS: number;
}

/**
 * @param args the words after the verb
 * @returns the exit code: 0 when every exercise asked is proven, 1 when one is not, 2 for bad input
 */
export async function proof(args: string[]): Promise<number> {
	const startedAt = performance.now();
	try {
		const asked = parse(args);
		const proven = await prove(asked);
		const tables = proven.map(({ table }) => table);
		if (asked.write) writeReport(proven);
		if (asked.json) process.stdout.write(`${JSON.stringify(tables)}\n`);
		else process.stdout.write(proven.map(({ table, cpuS }) => printProof(table, cpuS)).join('\n'));
		const tookS = (performance.now() - startedAt) / 1000;
		process.stdout.write(asked.json ? '' : summary(proven, asked.seeds, tookS));
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
	const exercises = askedExercises(positionals.at(0));
	const seeds = wholeNumber(values.seeds ?? String(DEFAULT_SEEDS), 'seeds', 1, 100_000);
	const fromSeed = wholeNumber(values['from-seed'] ?? '1', 'from-seed', 0, 2 ** 52);
	const { json = false, anew = false, write = false } = values;
	if (write) {
		if (seeds < REPORT_SEEDS || fromSeed !== 1)
			throw new BenchError('write', `write: a report stands on ${REPORT_SEEDS} seeds or more, from seed 1`);
		exercises.forEach(({ file }) => reportedName(file));
	}
	return { exercises, seeds, fromSeed, json, anew, write };
}

function read(args: string[]) {
	const options = {
		seeds: { type: 'string' },
		'from-seed': { type: 'string' },
		json: { type: 'boolean' },
		anew: { type: 'boolean' },
		write: { type: 'boolean' }
	} as const;
	try {
		return parseArgs({ args, options, allowPositionals: true });
	} catch (cause) {
		throw new BenchError('arguments', `${(cause as Error).message} ${USAGE}`);
	}
}

async function prove({ exercises, seeds, fromSeed, anew }: Asked): Promise<Proven[]> {
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
	const cache = new ProofCache();
	const known = tasks.map((task) => (anew ? undefined : cache.find(task)));
	let done = known.reduce((sum, found) => sum + (found?.proofs.length ?? 0), 0);
	const open = tasks.flatMap((task, index) => (known[index] ? [] : [{ task, index }]));
	await runTasks(
		open.map(({ task }) => task),
		(at, proofs, cpuS) => {
			const { task, index } = open[at];
			known[index] = { proofs, cpuS };
			cache.keep(task, { proofs, cpuS });
			done += proofs.length;
			report(done);
		}
	);
	return exercises.map(({ file, exercise }) => {
		const own = known.flatMap((found, i) => (found && tasks[i].file === file ? [found] : []));
		const table = tableOf(
			exercise,
			fromSeed,
			own.flatMap(({ proofs }) => proofs)
		);
		return { file, table, cpuS: own.reduce((sum, { cpuS }) => sum + cpuS, 0) };
	});
}

function summary(all: Proven[], seeds: number, tookS: number): string {
	const tables = all.map(({ table }) => table);
	const proven = tables.filter(({ passed }) => passed).length;
	const noun = tables.length === 1 ? 'exercise' : 'exercises';
	const failing = tables.filter(({ passed }) => !passed).map(({ exercise }) => exercise);
	const not = failing.length > 0 ? `; not proven: ${failing.join(', ')}` : '';
	const cpuS = median(all.map((one) => one.cpuS));
	return `\n${proven} of ${tables.length} ${noun} proven over ${seeds} seeds in ${tookS.toFixed(0)} s, median ${cpuS.toFixed(1)} s of one core${not}\n`;
}

function median(values: readonly number[]): number {
	const sorted = [...values].sort((a, b) => a - b);
	return (sorted[(sorted.length - 1) >> 1] + sorted[sorted.length >> 1]) / 2;
}
