import { cpSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createCourseFolder, LESSON, type CourseFolder } from '../../factories/course-folder';
import { figureBlock } from '../../factories/figure';

let course: CourseFolder;
beforeEach(() => {
	course = createCourseFolder();
});
afterEach(() => course.remove());

describe('importContent of what is broken', () => {
	const faults: [string, () => void, () => RegExp][] = [
		[
			'a key that nobody knows',
			() => course.change(course.exercise, 'client:', 'klient: x\nclient:'),
			() =>
				new RegExp(`^${course.slug}/${course.exercise}:${course.lineOf(course.exercise, 'klient')}: klient: `)
		],
		[
			'a value out of range',
			() => course.change(course.exercise, 'tries: 3', 'tries: 0'),
			() =>
				new RegExp(`^${course.slug}/${course.exercise}:${course.lineOf(course.exercise, 'tries')}: tries: `)
		],
		[
			'a name that is not drawn',
			() => course.change(course.exercise, '=carrierDbm', '=karrierDbm'),
			() =>
				new RegExp(
					`^${course.slug}/${course.exercise}:${course.lineOf(course.exercise, '=karrierDbm')}: scene.+levelDbm`
				)
		],
		[
			'what is no YAML',
			() => course.change(course.exercise, 'title:', 'title: ]['),
			() => new RegExp(`^${course.slug}/${course.exercise}:${course.lineOf(course.exercise, '][')}: `)
		],
		[
			'a course without units',
			() => course.write('course.yaml', { slug: course.slug, title: 'x', summary: 'y', units: [] }),
			() => new RegExp(`^${course.slug}/course.yaml:4: units: `)
		],
		[
			'a course under another name',
			() => course.change('course.yaml', `slug: ${course.slug}`, 'slug: elsewhere'),
			() => new RegExp(`^${course.slug}/course.yaml:1: slug: `)
		],
		[
			'a lesson that is missing',
			() => rmSync(course.path('06-spread/lesson.md')),
			() => /06-spread\/lesson.md:1: is missing/
		],
		[
			'a figure that the receiver can’t do',
			() => course.change(LESSON, '- 1000\n', '- 1001\n'),
			() =>
				new RegExp(
					`^${course.slug}/${LESSON}:${course.lineOf(LESSON, '- 1001')}: controls\\[0\\].choices\\[1\\]: `
				)
		],
		[
			'a figure with a key that nobody knows',
			() => course.change(LESSON, 'seed:', 'sead:'),
			() => new RegExp(`^${course.slug}/${LESSON}:\\d+: seed: `)
		],
		[
			'a figure that is no YAML',
			() => course.change(LESSON, 'caption:', 'caption: ]['),
			() => new RegExp(`^${course.slug}/${LESSON}:${course.lineOf(LESSON, '][')}: `)
		],
		[
			'two figures of one name',
			() => course.change(LESSON, 'So it does.', `So it does.\n\n${figureBlock()}`),
			() => new RegExp(`^${course.slug}/${LESSON}:\\d+: id: two figures of this lesson are called hump`)
		],
		[
			'a figure in a list',
			() => writeFileSync(course.path(LESSON), `# Why\n\n- ${figureBlock().replaceAll('\n', '\n  ')}`),
			() => new RegExp(`^${course.slug}/${LESSON}:3: a figure stands by itself`)
		],
		[
			'a file that no unit names',
			() => cpSync(course.path(course.exercise), course.path('06-spread/stray.yaml')),
			() => /06-spread\/stray.yaml:1: is not named in course.yaml/
		],
		[
			'a folder that is no unit',
			() => cpSync(course.path('06-spread'), course.path('07-nothing'), { recursive: true }),
			() => /course.yaml:4: units: the folder 07-nothing/
		]
	];
	it.each(faults)(
		'stops at %s with file, line and field, and publishes nothing',
		async (_, spoil, message) => {
			spoil();
			const stopped = course.run();
			await expect(stopped).rejects.toMatchObject({ name: 'ContentError' });
			await expect(stopped).rejects.toThrow(message());
			expect(await course.editions()).toEqual([]);
		}
	);

	it('lets no two exercises have one name', async () => {
		cpSync(join(course.root, course.slug), join(course.root, `${course.slug}-b`), { recursive: true });
		const file = join(course.root, `${course.slug}-b`, 'course.yaml');
		writeFileSync(file, readFileSync(file, 'utf8').replace(`slug: ${course.slug}`, `slug: ${course.slug}-b`));
		await expect(course.run()).rejects.toThrow(/two exercises are called/);
		expect(await course.editions()).toEqual([]);
	});
});
