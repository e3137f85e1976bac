/** Which exercises a command is asked about, and the numbers it is given. */
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import type { Exercise } from '$lib/schemas/exercise';
import { BenchError } from '$lib/server/bench/bench-error';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';

const CONTENT = 'content';

export interface AskedExercise {
	file: string;
	exercise: Exercise;
}

/** Every exercise under content/, in order. */
export const exerciseFiles = (): string[] =>
	readdirSync(CONTENT, { recursive: true, encoding: 'utf8' })
		.filter((path) => path.endsWith('.yaml') && !['course.yaml', 'glossary.yaml'].includes(basename(path)))
		.sort()
		.map((path) => join(CONTENT, path));

/** The exercise of that name or file, or all of content/ when there is no name. @throws BenchError naming what isn't there */
export function askedExercises(name: string | undefined): AskedExercise[] {
	const files = name === undefined ? exerciseFiles() : [fileOf(name)];
	return files.map((file) => ({ file, exercise: parseExerciseText(readFileSync(file, 'utf8'), file) }));
}

function fileOf(name: string): string {
	const file = existsSync(name) ? name : exerciseFiles().find((path) => basename(path, '.yaml') === name);
	if (file) return file;
	const known = exerciseFiles().map((path) => basename(path, '.yaml'));
	throw new BenchError(
		'exercise',
		`exercise: no file and no exercise is called ${name}; there are ${known.join(', ')}`
	);
}

/** @throws BenchError naming the option */
export function wholeNumber(text: string, name: string, least: number, most: number): number {
	const value = /^\d+$/.test(text) ? Number(text) : NaN;
	if (value >= least && value <= most) return value;
	throw new BenchError(name, `${name}: an integer from ${least} to ${most}; given ${text}`);
}
