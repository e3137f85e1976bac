import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { stringify } from 'yaml';
import { importContent } from '$lib/server/services/courses/import-content';
import { exerciseStart } from '$lib/server/services/course-drafts/outline/exercise-start';
import { figureBlock } from './figure';

let made = 0;

/** A course published from files: one unit, a lesson with a figure, one exercise that can be proven in a moment. */
export async function createWrittenCourse(): Promise<{
	slug: string;
	exercise: string;
	unit: string;
	lessonPath: string;
	exercisePath: string;
	files: Record<string, string>;
}> {
	made += 1;
	const [slug, unit, exercise] = [`quay-${made}`, `at-the-quay-${made}`, `quay-carrier-${made}`];
	const lessonPath = `03-${unit}/lesson.md`;
	const exercisePath = `03-${unit}/${exercise}.yaml`;
	const entry = {
		number: 3,
		slug: unit,
		title: 'At the quay',
		summary: 'One carrier.',
		exercises: [exercise]
	};
	const files = {
		'course.yaml': `# The quay’s.\n${stringify({ slug, title: 'Quay', summary: 'From the quay.', units: [entry] })}`,
		[lessonPath]: `# Why\n\nA **marker** reads one slice.\n\n${figureBlock()}\nSo it does.\n`,
		[exercisePath]: exerciseStart(exercise, 'A carrier at the quay')
	};
	const root = mkdtempSync(join(tmpdir(), 'content-'));
	try {
		for (const [path, text] of Object.entries(files)) {
			mkdirSync(join(root, slug, path, '..'), { recursive: true });
			writeFileSync(join(root, slug, path), text);
		}
		await importContent({ root, now: new Date('2026-03-02T09:00:00Z') });
	} finally {
		rmSync(root, { recursive: true });
	}
	return { slug, unit, exercise, lessonPath, exercisePath, files };
}
