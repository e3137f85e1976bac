import { type ChildProcess, spawn, type StdioOptions } from 'node:child_process';
import { atEnd } from './ending';

const STOP_LIMIT_MS = 10_000;

export interface Child {
	process: ChildProcess;
	/** Exit code, or 1 if a signal ended it. */
	ended: Promise<number>;
	stop(): Promise<unknown>;
}

/** Starts a Node.js program that ends, at the latest, with this command. */
export function startNode(
	args: string[],
	env: NodeJS.ProcessEnv = {},
	stdio: StdioOptions = 'inherit'
): Child {
	const child = spawn(process.execPath, args, { env: { ...process.env, ...env }, stdio });
	const ended = new Promise<number>((resolve, reject) => {
		child.on('error', reject);
		child.on('close', (code) => resolve(code ?? 1));
	});
	const stop = () => {
		if (child.exitCode === null && child.signalCode === null) {
			child.kill('SIGTERM');
			const impatient = setTimeout(() => child.kill('SIGKILL'), STOP_LIMIT_MS);
			void ended.finally(() => clearTimeout(impatient));
		}
		return ended;
	};
	atEnd(stop);
	return { process: child, ended, stop };
}

/** Runs a Node.js program to its end without showing what it says, unless it fails: then throws an Error that holds it all. */
export async function runQuietly(args: string[], env: NodeJS.ProcessEnv = {}): Promise<void> {
	const child = startNode(args, env, ['ignore', 'pipe', 'pipe']);
	let output = '';
	for (const stream of [child.process.stdout, child.process.stderr]) {
		stream?.on('data', (chunk) => (output += chunk));
	}
	const code = await child.ended;
	if (code !== 0) throw new Error(`${args.join(' ')} ended with ${code}:\n${output}`);
}
