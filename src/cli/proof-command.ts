/** The proof on the command line: progress on stderr, a table and one line that sums it up on stdout. */
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import { parseArgs } from 'node:util';
import { BenchError } from '$lib/server/bench/bench-error';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { proveExercise } from '$lib/server/bench/proof/prove-exercise';
import type { ProofTable } from '$lib/server/bench/proof/proof-table';
import { printProof } from './print-proof';

const CONTENT = 'content';
const BAD_INPUT = 2;
const DEFAULT_SEEDS = 200;
const USAGE =
	'proof [EXERCISE] [--seeds N] [--from-seed K] [--json]   EXERCISE: a slug in content/ or a file';

interface Asked {
	files: string[];
	seeds: number;
	fromSeed: number;
	json: boolean;
}

/**
 * @param args the words after the verb
 * @returns the exit code: 0 when every exercise asked is proven, 1 when one is not, 2 for bad input
 */
export async function proof(args: string[]): Promise<number> {
	try {
		const { files, seeds, fromSeed, json } = parse(args);
		const tables: ProofTable[] = [];
		for (const file of files) tables.push(proveFile(file, seeds, fromSeed));
		if (json) process.stdout.write(`${JSON.stringify(tables)}\n`);
		else process.stdout.write(tables.map(printProof).join('\n'));
		process.stdout.write(json ? '' : summary(tables, seeds));
		return tables.every(({ passed }) => passed) ? 0 : 1;
	} catch (error) {
		if (!(error instanceof BenchError)) throw error;
		process.stderr.write(`${error.message.replace(/\s+/g, ' ')}\n`);
		return BAD_INPUT;
	}
}

function parse(args: string[]): Asked {
	const options = {
		seeds: { type: 'string' },
		'from-seed': { type: 'string' },
		json: { type: 'boolean' }
	} as const;
	const parsed = attempt(() => parseArgs({ args, options, allowPositionals: true }));
	const { values, positionals } = parsed;
	if (positionals.length > 1)
		throw new BenchError('exercise', `exercise: name one, or none for all. ${USAGE}`);
	return {
		files: positionals.length === 1 ? [fileOf(positionals[0])] : exerciseFiles(),
		seeds: integer(values.seeds ?? String(DEFAULT_SEEDS), 'seeds', 1, 100_000),
		fromSeed: integer(values['from-seed'] ?? '1', 'from-seed', 0, 2 ** 52),
		json: values.json ?? false
	};
}

function attempt<T>(read: () => T): T {
	try {
		return read();
	} catch (cause) {
		throw new BenchError('arguments', `${(cause as Error).message} ${USAGE}`);
	}
}

function integer(text: string, name: string, least: number, most: number): number {
	const value = /^\d+$/.test(text) ? Number(text) : NaN;
	if (value >= least && value <= most) return value;
	throw new BenchError(name, `${name}: an integer from ${least} to ${most}; given ${text}`);
}

/** Every exercise under content/, in order. */
const exerciseFiles = (): string[] =>
	readdirSync(CONTENT, { recursive: true, encoding: 'utf8' })
		.filter((path) => path.endsWith('.yaml') && basename(path) !== 'course.yaml')
		.sort()
		.map((path) => join(CONTENT, path));

function fileOf(name: string): string {
	const file = existsSync(name) ? name : exerciseFiles().find((path) => basename(path, '.yaml') === name);
	if (file) return file;
	const known = exerciseFiles().map((path) => basename(path, '.yaml'));
	throw new BenchError(
		'exercise',
		`exercise: no file and no exercise is called ${name}; there are ${known.join(', ')}`
	);
}

function proveFile(file: string, seeds: number, fromSeed: number): ProofTable {
	const exercise = parseExerciseText(readFileSync(file, 'utf8'), file);
	const startedAt = performance.now();
	const shown = process.stderr.isTTY;
	const onProgress = (done: number) => {
		const text = `${exercise.slug}: ${done} of ${seeds} seeds, ${((performance.now() - startedAt) / 1000).toFixed(0)} s`;
		if (shown) process.stderr.write(`\r${text}${done === seeds ? '\n' : ''}`);
		else if (done % Math.ceil(seeds / 10) === 0 || done === seeds) process.stderr.write(`${text}\n`);
	};
	return proveExercise(exercise, { seeds, fromSeed, onProgress });
}

function summary(tables: ProofTable[], seeds: number): string {
	const proven = tables.filter(({ passed }) => passed).length;
	const noun = tables.length === 1 ? 'exercise' : 'exercises';
	return `\n${proven} of ${tables.length} ${noun} proven over ${seeds} seeds\n`;
}
