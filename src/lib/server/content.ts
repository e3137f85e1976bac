/** Reads content/: courses as their authors write them. Whatever is broken stops it with file, line and field. */
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { marked, type Token, type Tokens } from 'marked';
import { isMap, isNode, isSeq, LineCounter, parseDocument, type Document } from 'yaml';
import type { z } from 'zod';
import { courseFile, type CourseUnit } from '$lib/schemas/course-file';
import type { Exercise } from '$lib/schemas/exercise';
import type { Figure } from '$lib/schemas/figure';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { issuesOf, pathOf } from '$lib/server/bench/exercise/zod-issues';
import { parseFigureText } from '$lib/server/bench/figure/parse-figure';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';

/** Something in content/ can't be published: "harbour/06-power/spread.yaml:12: questions[0].unit: …". */
export class ContentError extends Error {
	override name = 'ContentError';
	constructor(
		readonly file: string,
		readonly line: number,
		readonly field: string,
		readonly reason: string
	) {
		super(`${file}:${line}: ${field ? `${field}: ` : ''}${reason}`);
	}
}

export interface UnitContent extends Omit<CourseUnit, 'exercises'> {
	lessonMarkdown: string;
	/** Of the lesson's figure blocks, in their order. */
	figures: Figure[];
	exercises: Exercise[];
}
export interface CourseContent {
	slug: string;
	title: string;
	summary: string;
	units: UnitContent[];
}

/** Exercises that have been checked before, by the hash of their file's text; what is read anew is added. */
export type CheckedExercises = Map<string, Exercise>;

/** Hash of a course's files as they stand, names and bytes; the engine's version with them, since checking draws scenes. */
export function hashOfCourse(root: string, folder: string): string {
	const hash = createHash('sha256').update(`course ${ENGINE_VERSION}`);
	const files = readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
		.filter((entry) => entry.isFile())
		.map((entry) => join(entry.parentPath, entry.name))
		.sort();
	for (const file of files) {
		const bytes = readFileSync(file);
		hash.update(`\n${relative(root, file)} ${bytes.length}\n`).update(bytes);
	}
	return hash.digest('hex');
}

const hashOfExercise = (text: string): string =>
	createHash('sha256').update(`exercise ${ENGINE_VERSION}\n`).update(text).digest('hex');

/**
 * Every course under `root`, in the order of their folders.
 * @param checked exercises that need no checking again
 * @throws ContentError at the first fault
 */
export function readContent(root: string, checked: CheckedExercises = new Map()): CourseContent[] {
	const courses = coursesIn(root).map((folder) => readCourse(root, folder, checked));
	refuseTwins(courses, 'exercises', ({ units }) => units.flatMap(({ exercises }) => exercises));
	refuseTwins(courses, 'units', ({ units }) => units);
	return courses;
}

/** Exercises and units are found by their names alone, whatever the course. */
function refuseTwins(
	courses: CourseContent[],
	what: string,
	namedIn: (course: CourseContent) => { slug: string }[]
): void {
	const seen = new Set<string>();
	for (const course of courses) {
		for (const { slug } of namedIn(course)) {
			if (seen.has(slug)) throw new ContentError(course.slug, 1, 'slug', `two ${what} are called ${slug}`);
			seen.add(slug);
		}
	}
}

function readCourse(root: string, folder: string, checked: CheckedExercises): CourseContent {
	const file = readYaml(root, join(folder, 'course.yaml'), courseFile);
	const { slug, title, summary, units } = file.value;
	if (slug !== folder) throw file.errorAt('slug', `must be the folder's name, ${folder}`);
	const expected = units.map((unit) => `${String(unit.number).padStart(2, '0')}-${unit.slug}`);
	const stray = foldersIn(join(root, folder)).find((name) => !expected.includes(name));
	if (stray) throw file.errorAt('units', `the folder ${stray} is no unit of this course`);
	return {
		slug,
		title,
		summary,
		units: units.map((unit, index) => readUnit(root, join(folder, expected[index]), unit, checked))
	};
}

function readUnit(root: string, folder: string, unit: CourseUnit, checked: CheckedExercises): UnitContent {
	const files = entriesIn(root, folder);
	const expected = ['lesson.md', ...unit.exercises.map((slug) => `${slug}.yaml`)];
	const missing = expected.find((name) => !files.includes(name));
	if (missing) throw new ContentError(join(folder, missing), 1, '', 'is missing');
	const stray = files.find((name) => !expected.includes(name));
	if (stray) throw new ContentError(join(folder, stray), 1, '', 'is not named in course.yaml');
	return {
		...unit,
		...readLesson(root, join(folder, 'lesson.md')),
		exercises: unit.exercises.map((slug) => readExercise(root, join(folder, `${slug}.yaml`), slug, checked))
	};
}

/** Whether a piece of Markdown is the block of a figure. */
export const isFigureBlock = (token: Token): token is Tokens.Code =>
	token.type === 'code' && (token as Tokens.Code).lang?.trim() === 'figure';

function readLesson(root: string, path: string): Pick<UnitContent, 'lessonMarkdown' | 'figures'> {
	const lessonMarkdown = readText(root, path);
	const figures: Figure[] = [];
	let line = 1;
	for (const token of marked.lexer(lessonMarkdown)) {
		if (isFigureBlock(token)) {
			const figure = readFigure(token.text, path, line + 1);
			if (figures.some(({ id }) => id === figure.id))
				throw new ContentError(path, line + 1, 'id', `two figures of this lesson are called ${figure.id}`);
			figures.push(figure);
		} else {
			marked.walkTokens([token], (inner) => {
				if (isFigureBlock(inner))
					throw new ContentError(path, line, '', 'a figure stands by itself, in no list and no quotation');
			});
		}
		line += token.raw.split('\n').length - 1;
	}
	return { lessonMarkdown, figures };
}

/** @param firstLine of the figure's text in the file */
function readFigure(text: string, path: string, firstLine: number): Figure {
	try {
		return parseFigureText(text);
	} catch (cause) {
		if (!(cause instanceof ExerciseError)) throw cause;
		const [{ field, message, line = 1 }] = cause.issues;
		throw new ContentError(path, firstLine + line - 1, field, message);
	}
}

function readExercise(root: string, path: string, slug: string, checked: CheckedExercises): Exercise {
	const text = readText(root, path);
	const hash = hashOfExercise(text);
	try {
		const exercise = checked.get(hash) ?? parseExerciseText(text, path);
		checked.set(hash, exercise);
		if (exercise.slug === slug) return exercise;
	} catch (cause) {
		if (!(cause instanceof ExerciseError)) throw cause;
		const [{ field, message, line }] = cause.issues;
		throw new ContentError(path, line ?? 1, field, message);
	}
	throw new ContentError(path, 1, 'slug', `must be the file's name, ${slug}`);
}

function readYaml<S extends z.ZodType>(root: string, path: string, schema: S) {
	const lines = new LineCounter();
	const document = parseDocument(readText(root, path), { lineCounter: lines, uniqueKeys: true });
	const [fault] = document.errors;
	if (fault) throw new ContentError(path, lines.linePos(fault.pos[0]).line, '', fault.message.split('\n')[0]);
	const errorAt = (field: string, reason: string) =>
		new ContentError(path, lineOf(document, lines, pathOf(field)), field, reason);
	const parsed = schema.safeParse(document.toJS());
	if (parsed.success) return { value: parsed.data as z.output<S>, errorAt };
	const [issue] = issuesOf(parsed.error);
	throw errorAt(issue.field, issue.message);
}

/** The line of the deepest part of `path` that the document has; a key stands on the line of its name. */
function lineOf(document: Document, lines: LineCounter, path: (string | number)[]): number {
	let offset = 0;
	let node: unknown = document.contents;
	for (const step of path) {
		const pair = isMap(node) ? node.items.find((item) => String(item.key) === String(step)) : undefined;
		const place = pair ? pair.key : isSeq(node) ? node.items[Number(step)] : undefined;
		if (!isNode(place) || !place.range) break;
		offset = place.range[0];
		node = pair ? pair.value : place;
	}
	return lines.linePos(offset).line;
}

function readText(root: string, path: string): string {
	try {
		return readFileSync(join(root, path), 'utf8');
	} catch (cause) {
		if ((cause as NodeJS.ErrnoException).code !== 'ENOENT') throw cause;
		throw new ContentError(path, 1, '', 'is missing');
	}
}

/** Folders of courses, in order. */
export const coursesIn = (root: string): string[] => foldersIn(root);

const foldersIn = (folder: string): string[] =>
	readdirSync(folder, { withFileTypes: true })
		.filter((entry) => entry.isDirectory())
		.map((entry) => entry.name)
		.sort();

function entriesIn(root: string, folder: string): string[] {
	try {
		return readdirSync(join(root, folder)).sort();
	} catch (cause) {
		if ((cause as NodeJS.ErrnoException).code !== 'ENOENT') throw cause;
		throw new ContentError(relative('.', folder), 1, '', 'the unit has no folder');
	}
}
