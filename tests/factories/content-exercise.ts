/** The exercises of content/, by slug, as the bench takes them. */
import { readdirSync, readFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import type { Exercise } from '$lib/schemas/exercise';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';

const ROOT = 'content';
const files = readdirSync(ROOT, { recursive: true, encoding: 'utf8' })
	// In the folder of a unit; beside those lie the course's own files.
	.filter((path) => /\/\d\d-[^/]+\/[^/]+\.yaml$/.test(path))
	.sort()
	.map((path) => join(ROOT, path));

export const contentSlugs = files.map((file) => basename(file, '.yaml'));

/** Where an exercise stands. */
export function contentFile(slug: string): string {
	const file = files.find((path) => basename(path, '.yaml') === slug);
	if (!file) throw new Error(`No exercise of content/ is called ${slug}`);
	return file;
}

/** @throws ExerciseError with file, line and field when its author got it wrong */
export function contentExercise(slug: string): Exercise {
	const file = contentFile(slug);
	return parseExerciseText(readFileSync(file, 'utf8'), file);
}
