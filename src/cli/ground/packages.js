import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { withLock } from './lock.js';

/** @typedef {{ packages: Record<string, { version?: string, optional?: boolean }> }} LockFile */

/**
 * Whether node_modules holds what package-lock.json asks for, by npm's own record of what it installed.
 * An interrupted install has no record, because npm writes it last.
 * @param {string} root
 */
export function packagesAreCurrent(root) {
	const record = join(root, 'node_modules/.package-lock.json');
	if (!existsSync(record)) return false;
	return lockFilesAgree(readJson(join(root, 'package-lock.json')), readJson(record));
}

/**
 * @param {LockFile} wanted package-lock.json
 * @param {LockFile} installed node_modules/.package-lock.json; lacks optional packages made for other machines
 */
export function lockFilesAgree(wanted, installed) {
	const missing = Object.entries(wanted.packages).some(
		([path, { version, optional }]) =>
			path !== '' && installed.packages[path]?.version !== version && !(optional && !installed.packages[path])
	);
	const stray = Object.keys(installed.packages).some((path) => !wanted.packages[path]);
	return !missing && !stray;
}

/**
 * Runs `npm ci`. Output is shown only if it fails; nothing is written to standard output.
 * @param {string} root
 * @returns {Promise<string>}
 */
export function installPackages(root) {
	return withLock(join(root, '.data/packages.lock'), async () => {
		if (packagesAreCurrent(root)) return 'installed by another command meanwhile';
		await npmCi(root);
		return 'installed';
	});
}

/**
 * @param {string} root
 * @returns {Promise<void>}
 */
function npmCi(root) {
	return new Promise((resolve, reject) => {
		const npm = process.env.npm_execpath;
		const [command, args] = npm ? [process.execPath, [npm, 'ci']] : ['npm', ['ci']];
		const child = spawn(command, args, { cwd: root, stdio: ['ignore', 'pipe', 'pipe'] });
		let output = '';
		child.stdout.on('data', (chunk) => (output += chunk));
		child.stderr.on('data', (chunk) => (output += chunk));
		const stop = () => child.kill('SIGTERM');
		process.once('SIGTERM', stop);
		child.on('error', reject);
		child.on('close', (code) => {
			process.off('SIGTERM', stop);
			if (code === 0) return resolve();
			console.error(`\n${output}`);
			reject(new Error(`npm ci ended with ${code}`));
		});
	});
}

/** @param {string} path */
function readJson(path) {
	return JSON.parse(readFileSync(path, 'utf8'));
}
