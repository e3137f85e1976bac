import { ContentError } from './content-error';

/** The files of one course, wherever they are kept: course.yaml, NN-unit/lesson.md, NN-unit/<exercise>.yaml. */
export interface ContentTree {
	/** The course's folder, with which the address of every fault begins. */
	name: string;
	/** Of every file, from the course's folder, in order. */
	paths: readonly string[];
	/** @returns undefined where there is no such file */
	read(path: string): Uint8Array | undefined;
}

/** A course whose files are at hand. */
export const treeOfFiles = (name: string, files: ReadonlyMap<string, Uint8Array>): ContentTree => ({
	name,
	paths: [...files.keys()].sort(),
	read: (path) => files.get(path)
});

/** The address of a file in the words of a fault. */
export const addressIn = (tree: ContentTree, path: string): string => `${tree.name}/${path}`;

const decoder = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });

/** A file as text. @throws ContentError when it is missing or no UTF-8 */
export function textIn(tree: ContentTree, path: string): string {
	const bytes = tree.read(path);
	if (!bytes) throw new ContentError(addressIn(tree, path), 1, '', 'is missing');
	try {
		return decoder.decode(bytes);
	} catch (cause) {
		if (!(cause instanceof TypeError)) throw cause;
		throw new ContentError(addressIn(tree, path), 1, '', 'is not UTF-8 text');
	}
}

/** Names of the folders that hold files. */
export const foldersIn = (tree: ContentTree): string[] => [
	...new Set(tree.paths.filter((path) => path.includes('/')).map((path) => path.split('/')[0]))
];

/** Paths within a folder, without its name. */
export const filesUnder = (tree: ContentTree, folder: string): string[] =>
	tree.paths.filter((path) => path.startsWith(`${folder}/`)).map((path) => path.slice(folder.length + 1));
