import { createHash } from 'node:crypto';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';
import type { ContentTree } from './content-tree';

/** Hash of a file's bytes, by which they are kept. */
export const hashOfBytes = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/** Hash of a course's files as they stand, names and bytes; the engine's version with them, since checking draws scenes. */
export function hashOfCourse(tree: ContentTree): string {
	const hash = createHash('sha256').update(`course ${ENGINE_VERSION}`);
	for (const path of tree.paths) {
		const bytes = tree.read(path) as Uint8Array;
		hash.update(`\n${tree.name}/${path} ${bytes.length}\n`).update(bytes);
	}
	return hash.digest('hex');
}

/** Hash of an exercise's text under the engine's version: what was found out by drawing and sweeping it holds for this. */
export const hashOfExercise = (text: string): string =>
	createHash('sha256').update(`exercise ${ENGINE_VERSION}\n`).update(text).digest('hex');
