/** A course of one unit with one exercise, in a folder of its own for each test, and what an author may do to its files. */
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { stringify } from 'yaml';
import { Course } from '$lib/server/db/models/course';
import { Edition } from '$lib/server/db/models/edition';
import { importContent } from '$lib/server/services/courses/import-content';
import { exerciseDefinition } from './exercise';
import { figureBlock } from './figure';

export const now = new Date('2026-03-02T09:00:00Z');
export const LESSON = '06-spread/lesson.md';
let made = 0;

export type CourseFolder = ReturnType<typeof createCourseFolder>;

/** Its slugs are its own; `remove` takes it away. */
export function createCourseFolder() {
	const root = mkdtempSync(join(tmpdir(), 'content-'));
	made += 1;
	const slug = `harbour-${made}`;
	const exerciseSlug = `spread-${made}`;
	const exercise = `06-spread/${exerciseSlug}.yaml`;
	const path = (name: string) => join(root, slug, name);
	const read = (name: string) => readFileSync(path(name), 'utf8');
	const write = (name: string, data: unknown) => writeFileSync(path(name), stringify(data));

	mkdirSync(path('06-spread'), { recursive: true });
	const unit = { number: 6, slug: 'spread', title: 'Spread', summary: 'Wide.', exercises: [exerciseSlug] };
	write('course.yaml', { slug, title: 'Harbour', summary: 'From the quay.', units: [unit] });
	writeFileSync(path(LESSON), `# Why\n\nA **marker** reads one slice.\n\n${figureBlock()}\nSo it does.\n`);
	write(exercise, exerciseDefinition({ slug: exerciseSlug }));

	return {
		root,
		slug,
		exerciseSlug,
		/** The exercise's file within the course. */
		exercise,
		path,
		write,
		change: (name: string, from: string | RegExp, to: string) =>
			writeFileSync(path(name), read(name).replace(from, to)),
		/** The number of the first line that holds `text`. */
		lineOf: (name: string, text: string) =>
			read(name)
				.split('\n')
				.findIndex((line) => line.includes(text)) + 1,
		run: () => importContent({ root, now }),
		editions: async () => {
			const course = await Course.findOne({ where: { slug } });
			return course ? Edition.findAll({ where: { courseId: course.id }, order: ['number'] }) : [];
		},
		remove: () => rmSync(root, { recursive: true })
	};
}
