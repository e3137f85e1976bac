/** What a command has begun and must end: undone in reverse order, however the command ends. */
import { Refusal } from './refusal.js';

const closers: (() => unknown)[] = [];
let ended: Promise<void> | undefined;

export interface Outcome {
	code: number;
	/** Printed when all else has ended, so that nothing follows it. */
	lastLine: string;
}

/** Registers what to do at the end; what was registered last is done first. */
export function atEnd(closer: () => unknown): void {
	closers.push(closer);
}

/**
 * Runs a command to its end: its exit code is what `work` returns. Ctrl-C, or a signal that asks to end, ends it with 0
 * (people end a server that way every day: it is no failure), or with `stoppedCode`.
 */
export async function runCommand(work: () => Promise<number | Outcome>, stoppedCode = 0): Promise<void> {
	for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
		process.on(signal, () => {
			if (!ended) console.log('\nEnding …');
			void end(stoppedCode);
		});
	}
	// Nobody reads any more (a closed terminal, a pipe to head): what was begun must be ended all the same.
	for (const stream of [process.stdout, process.stderr]) stream.on('error', () => void end(1));
	let code = 1;
	let lastLine: string | undefined;
	try {
		const outcome = await work();
		if (typeof outcome === 'number') code = outcome;
		else ({ code, lastLine } = outcome);
	} catch (error) {
		if (ended) return; // What was under way fails when it is stopped.
		console.error(error instanceof Refusal ? `\n${error.message}` : error);
	}
	await end(code, lastLine);
}

function end(code: number, lastLine?: string): Promise<void> {
	return (ended ??= closeAll(code, lastLine));
}

async function closeAll(code: number, lastLine?: string): Promise<void> {
	let exitCode = code;
	for (const closer of closers.reverse()) {
		try {
			await closer();
		} catch (error) {
			console.error(error);
			exitCode = 1;
		}
	}
	if (lastLine !== undefined) console.log(lastLine);
	process.exit(exitCode);
}
