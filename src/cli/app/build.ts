import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { withLock } from '../ground/lock.js';
import { runQuietly } from '../ground/child';

/** What the production build is made from; src/cli runs from its sources. */
const INPUTS = [
	'src',
	'static',
	'migrations',
	'package.json',
	'package-lock.json',
	'svelte.config.js',
	'vite.config.ts',
	'tailwind.config.ts',
	'tsconfig.json'
];
const LEFT_OUT = join('src', 'cli');

/** Makes the production build in `folder` unless it is there and made from these very sources. */
export async function ensureBuild(folder: string): Promise<string> {
	const stamp = join(folder, 'made-from');
	const sources = hashOfInputs();
	const isCurrent = () => existsSync(stamp) && readFileSync(stamp, 'utf8') === sources;
	if (isCurrent()) return 'sources unchanged';
	// One at a time: all builds pass through the same intermediate folder.
	return withLock('.data/build.lock', async () => {
		if (isCurrent()) return 'made by another command meanwhile';
		rmSync(stamp, { force: true });
		await runQuietly(['node_modules/vite/bin/vite.js', 'build'], {
			BUILD_FOLDER: folder,
			NODE_ENV: 'production'
		});
		writeFileSync(stamp, sources);
		return `made in ${folder}`;
	});
}

/** A hash over the names and contents of all inputs, and the version of Node.js. */
export function hashOfInputs(): string {
	const hash = createHash('sha256').update(process.version);
	for (const path of INPUTS.filter((input) => existsSync(input)).flatMap(filesIn)) {
		hash.update(`\0${path}\0`).update(readFileSync(path));
	}
	return hash.digest('hex');
}

function filesIn(path: string): string[] {
	if (path === LEFT_OUT) return [];
	if (!statSync(path).isDirectory()) return [path];
	return readdirSync(path)
		.sort()
		.flatMap((name) => filesIn(join(path, name)));
}
