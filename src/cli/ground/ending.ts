/** What a command has begun and must end: undone in reverse order, however the command ends. */
import { Refusal } from './refusal.js';

const closers: (() => unknown)[] = [];
let ended: Promise<void> | undefined;

/** Registers what to do at the end; what was registered last is done first. */
export function atEnd(closer: () => unknown): void {
	closers.push(closer);
}

/**
 * Runs a command to its end: its exit code is what `work` returns. Ctrl-C, or a signal that asks to end, ends it with 0
 * (people end a server that way every day: it is no failure), or with `stoppedCode`.
 */
export async function runCommand(work: () => Promise<number>, stoppedCode = 0): Promise<void> {
	for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
		process.on(signal, () => {
			if (!ended) console.log('\nEnding …');
			void end(stoppedCode);
		});
	}
	let code: number;
	try {
		code = await work();
	} catch (error) {
		if (ended) return; // What was under way fails when it is stopped.
		console.error(error instanceof Refusal ? `\n${error.message}` : error);
		code = 1;
	}
	await end(code);
}

function end(code: number): Promise<void> {
	return (ended ??= closeAll(code));
}

async function closeAll(code: number): Promise<void> {
	let exitCode = code;
	for (const closer of closers.reverse()) {
		try {
			await closer();
		} catch (error) {
			console.error(error);
			exitCode = 1;
		}
	}
	process.exit(exitCode);
}
