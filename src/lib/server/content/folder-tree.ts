import { readdirSync, readFileSync } from 'node:fs';
import { join, relative, sep } from 'node:path';
import type { ContentTree } from './content-tree';

/** A course as it stands in a folder of the file system. */
export function treeOfFolder(root: string, name: string): ContentTree {
	const folder = join(root, name);
	const paths = readdirSync(folder, { recursive: true, withFileTypes: true })
		.filter((entry) => entry.isFile())
		.map((entry) => relative(folder, join(entry.parentPath, entry.name)).split(sep).join('/'))
		.sort();
	return {
		name,
		paths,
		read: (path) => (paths.includes(path) ? readFileSync(join(folder, path)) : undefined)
	};
}

/** Folders of courses under `root`, in order. */
export const coursesIn = (root: string): string[] =>
	readdirSync(root, { withFileTypes: true })
		.filter((entry) => entry.isDirectory())
		.map((entry) => entry.name)
		.sort();
