/** The bench on the command line: `npm run -s bench -- VERB FILE|-`, JSON in and out. Bad input: one line naming the field, exit 2. */
import { readFileSync } from 'node:fs';
import { BenchError } from '$lib/server/bench/bench-error';
import { readCommand } from '$lib/server/bench/commands/read-command';
import { sweepCommand } from '$lib/server/bench/commands/sweep-command';
import { truthCommand } from '$lib/server/bench/commands/truth-command';
import { benchHelp } from './bench-help';
import { proof } from './proof-command';

const BAD_INPUT = 2;
const NO_NUMBER = 3;

const verbs: Record<string, (input: unknown) => unknown> = {
	sweep: sweepCommand,
	read: readCommand,
	truth: truthCommand
};

async function main([verb, file, ...rest]: string[]): Promise<number> {
	if (verb === undefined || verb === 'help') {
		process.stdout.write(benchHelp());
		return verb ? 0 : BAD_INPUT;
	}
	if (verb === 'proof') return proof([file, ...rest].filter((word) => word !== undefined));
	const run = verbs[verb];
	if (!run)
		return refuse(`verb: no such verb "${verb}"; there are ${Object.keys(verbs).join(', ')}, proof, help`);
	if (!file || rest.length > 0) return refuse('file: name one JSON file, or - for standard input');
	try {
		const output = run(readJson(file));
		process.stdout.write(`${JSON.stringify(output)}\n`);
		return isProblem(output) ? NO_NUMBER : 0;
	} catch (error) {
		if (error instanceof BenchError) return refuse(`${error.field}: ${oneLine(error.message)}`);
		throw error;
	}
}

function readJson(file: string): unknown {
	let text: string;
	try {
		text = readFileSync(file === '-' ? 0 : file, 'utf8');
	} catch (error) {
		throw new BenchError(
			'file',
			`cannot be read (${(error as NodeJS.ErrnoException).code ?? 'error'}): ${file}`
		);
	}
	try {
		return JSON.parse(text);
	} catch (error) {
		throw new BenchError('file', `is not JSON: ${(error as Error).message}`);
	}
}

const isProblem = (output: unknown): boolean =>
	typeof output === 'object' && output !== null && 'problem' in output;
const oneLine = (text: string): string => text.replace(/\s+/g, ' ');

function refuse(line: string): number {
	process.stderr.write(`${line}\n`);
	return BAD_INPUT;
}

process.exitCode = await main(process.argv.slice(2));
