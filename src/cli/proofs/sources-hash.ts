import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { posix } from 'node:path';

const IMPORTED = /\b(?:from|import)\s*\(?\s*'([\w@$./:-]+)'/g;
const require = createRequire(import.meta.url);

/**
 * Names what a module does: a hash over its own text, that of every module of this repository that it imports, however far down,
 * and the versions of the packages they use.
 * @param entry path from the repository's root
 */
export function sourcesHash(entry: string): string {
	const texts = new Map<string, string>();
	const packages = new Set<string>();
	const waiting = [entry];
	for (let file = waiting.pop(); file !== undefined; file = waiting.pop()) {
		if (texts.has(file)) continue;
		const text = readFileSync(file, 'utf8');
		texts.set(file, text);
		for (const [, specifier] of text.matchAll(IMPORTED)) {
			const target = fileOf(file, specifier);
			if (target) waiting.push(target);
			else if (!specifier.startsWith('node:')) packages.add(packageOf(specifier));
		}
	}
	const hash = createHash('sha256');
	for (const [file, text] of [...texts].sort(byName)) hash.update(`${file}\n${text.length}\n${text}`);
	for (const name of [...packages].sort()) hash.update(`${name} ${versionOf(name)}\n`);
	return hash.digest('hex');
}

const byName = ([a]: [string, string], [b]: [string, string]): number => (a < b ? -1 : 1);

/** The file that a specifier names in this repository; undefined where it names a package. */
function fileOf(from: string, specifier: string): string | undefined {
	const path = specifier.startsWith('$lib/')
		? `src/lib/${specifier.slice('$lib/'.length)}`
		: specifier.startsWith('.')
			? posix.join(posix.dirname(from), specifier)
			: undefined;
	if (path === undefined) return undefined;
	return existsSync(`${path}.ts`) ? `${path}.ts` : path;
}

const packageOf = (specifier: string): string =>
	specifier
		.split('/')
		.slice(0, specifier.startsWith('@') ? 2 : 1)
		.join('/');

function versionOf(name: string): string {
	const { version } = require(`${process.cwd()}/node_modules/${name}/package.json`) as { version: string };
	return version;
}
