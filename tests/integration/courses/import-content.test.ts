import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { stringify } from 'yaml';
import { CheckedContent } from '$lib/server/db/models/checked-content';
import { Course } from '$lib/server/db/models/course';
import { EditionFile } from '$lib/server/db/models/edition-file';
import { FileContent } from '$lib/server/db/models/file-content';
import { Edition } from '$lib/server/db/models/edition';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { importContent } from '$lib/server/services/courses/import-content';
import { exerciseDefinition } from '../../factories/exercise';
import { createUser } from '../../factories/user';
import { figureBlock, writtenFigure } from '../../factories/figure';

const now = new Date('2026-03-02T09:00:00Z');
let root: string;
let slug: string;
let made = 0;

/** A course of one unit with one exercise, in a folder of its own. */
beforeEach(() => {
	root = mkdtempSync(join(tmpdir(), 'content-'));
	made += 1;
	slug = `harbour-${made}`;
	mkdirSync(join(root, slug, '06-spread'), { recursive: true });
	write('course.yaml', {
		slug,
		title: 'Harbour',
		summary: 'From the quay.',
		units: [{ number: 6, slug: 'spread', title: 'Spread', summary: 'Wide.', exercises: [`spread-${made}`] }]
	});
	writeFileSync(
		path('06-spread/lesson.md'),
		`# Why\n\nA **marker** reads one slice.\n\n${figureBlock()}\nSo it does.\n`
	);
	write(`06-spread/spread-${made}.yaml`, exerciseDefinition({ slug: `spread-${made}` }));
});
afterEach(() => rmSync(root, { recursive: true }));

const path = (name: string) => join(root, slug, name);
const write = (name: string, data: unknown) => writeFileSync(path(name), stringify(data));
const change = (name: string, from: string | RegExp, to: string) =>
	writeFileSync(path(name), readFileSync(path(name), 'utf8').replace(from, to));
const LESSON = '06-spread/lesson.md';
const exerciseFile = () => `06-spread/spread-${made}.yaml`;
const run = () => importContent({ root, now });
const editions = async () => {
	const course = await Course.findOne({ where: { slug } });
	return course ? Edition.findAll({ where: { courseId: course.id }, order: ['number'] }) : [];
};

describe('importContent({root, now})', () => {
	it('publishes the courses of this repository', async () => {
		const imported = await importContent({ root: 'content', now });
		expect(imported.length).toBeGreaterThan(0);
		expect(imported.every(({ edition, created }) => edition === 1 && created)).toBe(true);
	}, 120_000);

	it('keeps what a unit needs, and refuses a skill that no unit teaches', async () => {
		change('course.yaml', 'summary: Wide.', 'summary: Wide.\n    doneWith: 1');
		await run();
		const [edition] = await editions();
		const unit = await Unit.findOne({ where: { editionId: edition.id }, rejectOnEmpty: true });
		expect(unit).toMatchObject({ needs: [], doneWith: 1 });
		change(exerciseFile(), '    id: power', '    id: power\n    skill: nothing');
		await expect(run()).rejects.toMatchObject({
			file: `${slug}/${exerciseFile()}`,
			field: 'questions[0].skill',
			reason: 'nothing is no unit of this course'
		});
		expect(await editions()).toHaveLength(1);
	});

	it('keeps the glossary with the edition, marks its terms in lessons, and names what is wrong in it', async () => {
		const entry = { term: 'Marker', forms: ['markers'], definition: 'A point on a trace.', unit: 'spread' };
		write('glossary.yaml', [entry]);
		await run();
		const [edition] = await editions();
		expect(edition.glossary).toEqual([{ ...entry, slug: 'marker' }]);
		const unit = await Unit.findOne({ where: { editionId: edition.id }, rejectOnEmpty: true });
		expect(JSON.stringify(unit.lesson.parts)).toContain('/learn/glossary#marker');
		const refusals: [unknown[], string, string][] = [
			[[{ ...entry, unit: 'nothing' }], '[0].unit', 'nothing is no unit of this course'],
			[[entry, { ...entry, forms: [] }], '[1].term', '“Marker” stands here twice'],
			[[entry, { ...entry, term: 'Flag' }], '[1].term', '“markers” is a name of “marker” already'],
			[[{ ...entry, meaning: 'x' }], '[0]', 'meaning']
		];
		for (const [entries, field, reason] of refusals) {
			write('glossary.yaml', entries);
			await expect(run()).rejects.toMatchObject({
				file: `${slug}/glossary.yaml`,
				field: expect.stringContaining(field) as string,
				message: expect.stringContaining(reason) as string
			});
		}
		expect(await editions()).toHaveLength(1);
	});

	it('publishes a course with its units, lessons and exercises', async () => {
		expect(await run()).toEqual([{ slug, edition: 1, created: true, writtenAtDesk: false }]);
		const [edition] = await editions();
		expect(edition).toMatchObject({ number: 1, title: 'Harbour', summary: 'From the quay.', createdAt: now });
		const [unit] = await Unit.findAll({ where: { editionId: edition.id } });
		expect(unit).toMatchObject({ number: 6, slug: 'spread', title: 'Spread' });
		expect(unit.lesson).toEqual({
			title: 'Why',
			words: 8,
			parts: [
				{ kind: 'text', html: '<p>A <strong>marker</strong> reads one slice.</p>' },
				{ kind: 'figure', id: 'hump' },
				{ kind: 'text', html: '<p>So it does.</p>' }
			]
		});
		expect(unit.figures).toEqual([{ ...writtenFigure(), rangeDb: 80 }]);
		const [exercise] = await Exercise.findAll({ where: { editionId: edition.id } });
		expect(exercise).toMatchObject({ unitId: unit.id, number: 1, slug: `spread-${made}`, tries: 3 });
		expect(exercise.definition).toEqual(exerciseDefinition({ slug: `spread-${made}` }));
		expect(exercise.situationHtml.trim()).toBe(
			'<p>The lead loses <strong>{leadLossDb | 1} dB</strong>. Measure at the coupler’s port.</p>'
		);
	});

	it('makes no edition when nothing has changed, however often and by however many it is run', async () => {
		await Promise.all([run(), run(), run()]);
		expect(await run()).toEqual([{ slug, edition: 1, created: false, writtenAtDesk: false }]);
		expect(await editions()).toHaveLength(1);
	});

	it('looks at no exercise again while the files are the same, nor at those that are, in a course that changed', async () => {
		await importContent({ root: 'content', now });
		const startedAt = performance.now();
		const again = await importContent({ root: 'content', now });
		// Checking one exercise alone takes longer than this.
		expect(performance.now() - startedAt).toBeLessThan(1000);
		expect(again.every(({ created }) => !created)).toBe(true);

		await run();
		const own = (await CheckedContent.findAll()).find(
			({ definition }) => definition?.slug === `spread-${made}`
		);
		// Were the file checked again, this title would not be there.
		await own!.update({ definition: { ...own!.definition!, title: 'As it was checked' } });
		change(LESSON, 'slice', 'part');
		expect(await run()).toEqual([{ slug, edition: 2, created: true, writtenAtDesk: false }]);
		const second = (await editions())[1];
		const [exercise] = await Exercise.findAll({ where: { editionId: second.id } });
		expect(exercise.title).toBe('As it was checked');
	});

	it('keeps the files an edition was made of, byte for byte, and fills them in for an edition that has none', async () => {
		await run();
		const [edition] = await editions();
		const filesOf = async () => {
			const files = await EditionFile.findAll({ where: { editionId: edition.id }, order: ['path'] });
			const contents = await FileContent.findAll({ where: { hash: files.map(({ hash }) => hash) } });
			return files.map(({ path: name, hash }) => [name, contents.find((one) => one.hash === hash)!.bytes]);
		};
		const asWritten = [LESSON, exerciseFile(), 'course.yaml'].map((name) => [name, readFileSync(path(name))]);
		expect(await filesOf()).toEqual(asWritten);
		await EditionFile.destroy({ where: { editionId: edition.id } });
		expect(await run()).toEqual([{ slug, edition: 1, created: false, writtenAtDesk: false }]);
		expect(await filesOf()).toEqual(asWritten);
	});

	it('leaves a course alone that somebody has published at the desk since', async () => {
		await run();
		const [edition] = await editions();
		const { user } = await createUser('instructor');
		const { courseId, title, summary } = edition;
		const contentHash = '0'.repeat(64);
		await Edition.create({
			courseId,
			number: 2,
			title,
			summary,
			contentHash,
			createdAt: now,
			publishedBy: user.id
		});
		change(LESSON, 'slice', 'part');
		expect(await run()).toEqual([{ slug, edition: 2, created: false, writtenAtDesk: true }]);
		expect(await editions()).toHaveLength(2);
	});

	it('publishes anew what goes back to what it was before the newest edition', async () => {
		await run();
		change(LESSON, 'slice', 'part');
		await run();
		change(LESSON, 'part', 'slice');
		expect(await run()).toEqual([{ slug, edition: 3, created: true, writtenAtDesk: false }]);
	});

	it.each([
		['a lesson', '06-spread/lesson.md', 'slice', 'part'],
		['a figure', '06-spread/lesson.md', 'climbs', 'rises'],
		['an exercise', '', 'tries: 3', 'tries: 4'],
		['the course', 'course.yaml', 'From the quay.', 'From the pier.']
	])(
		'makes a new edition when %s has changed, and leaves the old one as it was',
		async (_, name, from, to) => {
			await run();
			const [before] = await editions();
			const old = await Exercise.findAll({ where: { editionId: before.id } });
			change(name || exerciseFile(), from, to);
			expect(await run()).toEqual([{ slug, edition: 2, created: true, writtenAtDesk: false }]);
			const [first, second] = await editions();
			expect(first.get()).toEqual(before.get());
			expect(second.contentHash).not.toBe(first.contentHash);
			const kept = await Exercise.findAll({ where: { editionId: before.id } });
			expect(kept.map((row) => row.get())).toEqual(old.map((row) => row.get()));
		}
	);

	const lineOf = (name: string, text: string) =>
		readFileSync(path(name), 'utf8')
			.split('\n')
			.findIndex((line) => line.includes(text)) + 1;
	const faults: [string, () => void, () => RegExp][] = [
		[
			'a key that nobody knows',
			() => change(exerciseFile(), 'client:', 'klient: x\nclient:'),
			() => new RegExp(`^${slug}/${exerciseFile()}:${lineOf(exerciseFile(), 'klient')}: klient: `)
		],
		[
			'a value out of range',
			() => change(exerciseFile(), 'tries: 3', 'tries: 0'),
			() => new RegExp(`^${slug}/${exerciseFile()}:${lineOf(exerciseFile(), 'tries')}: tries: `)
		],
		[
			'a name that is not drawn',
			() => change(exerciseFile(), '=carrierDbm', '=karrierDbm'),
			() => new RegExp(`^${slug}/${exerciseFile()}:${lineOf(exerciseFile(), '=karrierDbm')}: scene.+levelDbm`)
		],
		[
			'what is no YAML',
			() => change(exerciseFile(), 'title:', 'title: ]['),
			() => new RegExp(`^${slug}/${exerciseFile()}:${lineOf(exerciseFile(), '][')}: `)
		],
		[
			'a course without units',
			() => write('course.yaml', { slug, title: 'x', summary: 'y', units: [] }),
			() => new RegExp(`^${slug}/course.yaml:4: units: `)
		],
		[
			'a course under another name',
			() => change('course.yaml', `slug: ${slug}`, 'slug: elsewhere'),
			() => new RegExp(`^${slug}/course.yaml:1: slug: `)
		],
		[
			'a lesson that is missing',
			() => rmSync(path('06-spread/lesson.md')),
			() => /06-spread\/lesson.md:1: is missing/
		],
		[
			'a figure that the receiver can’t do',
			() => change(LESSON, '- 1000\n', '- 1001\n'),
			() => new RegExp(`^${slug}/${LESSON}:${lineOf(LESSON, '- 1001')}: controls\\[0\\].choices\\[1\\]: `)
		],
		[
			'a figure with a key that nobody knows',
			() => change(LESSON, 'seed:', 'sead:'),
			() => new RegExp(`^${slug}/${LESSON}:\\d+: seed: `)
		],
		[
			'a figure that is no YAML',
			() => change(LESSON, 'caption:', 'caption: ]['),
			() => new RegExp(`^${slug}/${LESSON}:${lineOf(LESSON, '][')}: `)
		],
		[
			'two figures of one name',
			() => change(LESSON, 'So it does.', `So it does.\n\n${figureBlock()}`),
			() => new RegExp(`^${slug}/${LESSON}:\\d+: id: two figures of this lesson are called hump`)
		],
		[
			'a figure in a list',
			() => writeFileSync(path(LESSON), `# Why\n\n- ${figureBlock().replaceAll('\n', '\n  ')}`),
			() => new RegExp(`^${slug}/${LESSON}:3: a figure stands by itself`)
		],
		[
			'a file that no unit names',
			() => cpSync(path(exerciseFile()), path('06-spread/stray.yaml')),
			() => /06-spread\/stray.yaml:1: is not named in course.yaml/
		],
		[
			'a folder that is no unit',
			() => cpSync(path('06-spread'), path('07-nothing'), { recursive: true }),
			() => /course.yaml:4: units: the folder 07-nothing/
		]
	];
	it.each(faults)(
		'stops at %s with file, line and field, and publishes nothing',
		async (_, spoil, message) => {
			spoil();
			const stopped = run();
			await expect(stopped).rejects.toMatchObject({ name: 'ContentError' });
			await expect(stopped).rejects.toThrow(message());
			expect(await editions()).toEqual([]);
		}
	);

	it('lets no two exercises have one name', async () => {
		cpSync(join(root, slug), join(root, `${slug}-b`), { recursive: true });
		const file = join(root, `${slug}-b`, 'course.yaml');
		writeFileSync(file, readFileSync(file, 'utf8').replace(`slug: ${slug}`, `slug: ${slug}-b`));
		await expect(run()).rejects.toThrow(/two exercises are called/);
		expect(await editions()).toEqual([]);
	});

	it('leaves the tables unchanged when it fails late', async () => {
		Exercise.addHook('afterBulkCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(run()).rejects.toThrow('late');
		Exercise.removeHook('afterBulkCreate', 'fail late');
		expect(await editions()).toEqual([]);
	});
});
