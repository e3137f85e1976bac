import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';

/**
 * Runs `work` while this process holds the lock file; another process waits for it, up to `waitS` seconds.
 * A lock whose process is gone is taken over.
 * @template T
 * @param {string} path
 * @param {() => Promise<T>} work
 * @param {number} [waitS]
 * @returns {Promise<T>}
 */
export async function withLock(path, work, waitS = 600) {
	mkdirSync(dirname(path), { recursive: true });
	const giveUpMs = performance.now() + waitS * 1000;
	while (!take(path)) {
		if (performance.now() > giveUpMs) {
			throw new Error(
				`Process ${holderOf(path)} has held ${path} for ${waitS} s; if that is none of ours, remove the file`
			);
		}
		await sleep(100);
	}
	try {
		return await work();
	} finally {
		rmSync(path, { force: true });
	}
}

/** @param {number} pid */
export function isAlive(pid) {
	try {
		process.kill(pid, 0);
		return true;
	} catch (error) {
		// EPERM: it lives, but belongs to someone else.
		return error instanceof Error && 'code' in error && error.code === 'EPERM';
	}
}

/**
 * The file is linked into place complete, so that nobody ever reads a lock without its holder.
 * @param {string} path
 */
function take(path) {
	const own = `${path}.${process.pid}`;
	writeFileSync(own, String(process.pid));
	try {
		linkSync(own, path);
		return true;
	} catch (error) {
		if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error;
		dropDead(path);
		return false;
	} finally {
		rmSync(own, { force: true });
	}
}

/**
 * Removes the lock of a dead process. Two may try at once: what was moved aside is looked at again,
 * and goes back if it turns out to be the new lock of a living one.
 * @param {string} path
 */
function dropDead(path) {
	const holder = holderOf(path);
	if (holder === undefined || isAlive(holder)) return;
	const aside = `${path}.dead.${process.pid}`;
	try {
		renameSync(path, aside);
	} catch {
		return; // Someone else was quicker: the next round sees what they made of it.
	}
	if (holderOf(aside) === holder) rmSync(aside, { force: true });
	else renameSync(aside, path);
}

/** @param {string} path */
function holderOf(path) {
	try {
		return Number(readFileSync(path, 'utf8'));
	} catch {
		return undefined; // Released between two looks.
	}
}
