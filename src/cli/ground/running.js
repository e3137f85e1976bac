import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { isAlive } from './lock.js';

/**
 * A server that one of our commands keeps running; `address` is known once it answers.
 * @typedef {{ pid: number, verb: string, address?: string }} Running
 */

/** @param {string} verb */
const noteFile = (verb) => join('.data/running', `${verb}.json`);

/**
 * The running instance of this checkout, if there is one. A note left by one that died is no instance.
 * @param {string} verb
 * @returns {Running | undefined}
 */
export function findRunning(verb) {
	if (!existsSync(noteFile(verb))) return undefined;
	const running = /** @type {Running} */ (JSON.parse(readFileSync(noteFile(verb), 'utf8')));
	return isAlive(running.pid) && isOurs(running.pid) ? running : undefined;
}

/** @param {Running} running */
export function describeRunning({ pid, verb, address }) {
	if (!address) return `Sweepwright is being started already, by process ${pid}.`;
	return `Sweepwright is running already: ${address} (npm ${verb === 'start' ? 'start' : 'run dev'}, process ${pid}; Ctrl-C there, or kill ${pid}, ends it).`;
}

/** @param {Running} running */
export function noteRunning(running) {
	mkdirSync(dirname(noteFile(running.verb)), { recursive: true });
	writeFileSync(noteFile(running.verb), JSON.stringify(running));
}

/** @param {string} verb */
export function forgetRunning(verb) {
	rmSync(noteFile(verb), { force: true });
}

/**
 * A process id may have been given to another program since the note was written. Where /proc can't be read, believe the note.
 * @param {number} pid
 */
function isOurs(pid) {
	try {
		return readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('bootstrap.js');
	} catch {
		return true;
	}
}
