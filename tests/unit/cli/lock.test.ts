import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { isAlive, withLock } from '../../../src/cli/ground/lock.js';

let folder: string;
let lock: string;
beforeEach(() => {
	folder = mkdtempSync(join(tmpdir(), 'lock-'));
	lock = join(folder, 'lock');
});
afterEach(() => rmSync(folder, { recursive: true }));

const lockModule = new URL('../../../src/cli/ground/lock.js', import.meta.url).href;

/** A process of its own that adds one to a number in a file, twenty times, each time under the lock. */
function countingProcess(counter: string): Promise<number | null> {
	const program = `
		import { readFileSync, writeFileSync } from 'node:fs';
		import { setTimeout as sleep } from 'node:timers/promises';
		import { withLock } from '${lockModule}';
		for (let i = 0; i < 20; i++) await withLock('${lock}', async () => {
			const before = Number(readFileSync('${counter}', 'utf8'));
			await sleep(1);
			writeFileSync('${counter}', String(before + 1));
		});`;
	const child = spawn(process.execPath, ['--input-type=module', '--eval', program], { stdio: 'inherit' });
	return new Promise((resolve) => child.on('close', resolve));
}

describe('withLock(path, work)', () => {
	it('lets one process at a time do its work', async () => {
		const { readFileSync } = await import('node:fs');
		const counter = join(folder, 'counter');
		writeFileSync(counter, '0');
		expect(await Promise.all([countingProcess(counter), countingProcess(counter)])).toEqual([0, 0]);
		expect(readFileSync(counter, 'utf8')).toBe('40');
	}, 30_000);

	it('takes over from a process that died with the lock', async () => {
		const child = spawn(process.execPath, ['--version'], { stdio: 'ignore' });
		await new Promise((resolve) => child.on('close', resolve));
		writeFileSync(lock, String(child.pid));
		expect(await withLock(lock, async () => 'mine', 5)).toBe('mine');
	});

	it('gives up on a living holder after the time it was given, and names it', async () => {
		writeFileSync(lock, String(process.pid));
		await expect(withLock(lock, async () => 'mine', 0.3)).rejects.toThrow(String(process.pid));
	});

	it('lets go when the work fails', async () => {
		await expect(withLock(lock, () => Promise.reject(new Error('planted')))).rejects.toThrow('planted');
		expect(existsSync(lock)).toBe(false);
	});
});

describe('isAlive(pid)', () => {
	it('knows this process', () => expect(isAlive(process.pid)).toBe(true));
});
