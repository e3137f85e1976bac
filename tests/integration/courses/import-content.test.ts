import { readFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { CheckedContent } from '$lib/server/db/models/checked-content';
import { EditionFile } from '$lib/server/db/models/edition-file';
import { FileContent } from '$lib/server/db/models/file-content';
import { Edition } from '$lib/server/db/models/edition';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import { importContent } from '$lib/server/services/courses/import-content';
import { createCourseFolder, LESSON, now, type CourseFolder } from '../../factories/course-folder';
import { exerciseDefinition } from '../../factories/exercise';
import { writtenFigure } from '../../factories/figure';
import { createUser } from '../../factories/user';

let course: CourseFolder;
beforeEach(() => {
	course = createCourseFolder();
});
afterEach(() => course.remove());

describe('importContent({root, now})', () => {
	it('publishes the courses of this repository', async () => {
		const imported = await importContent({ root: 'content', now });
		expect(imported.length).toBeGreaterThan(0);
		expect(imported.every(({ edition, created }) => edition === 1 && created)).toBe(true);
	}, 120_000);

	it('keeps what a unit needs, and refuses a skill that no unit teaches', async () => {
		course.change('course.yaml', 'summary: Wide.', 'summary: Wide.\n    doneWith: 1');
		await course.run();
		const [edition] = await course.editions();
		const unit = await Unit.findOne({ where: { editionId: edition.id }, rejectOnEmpty: true });
		expect(unit).toMatchObject({ needs: [], doneWith: 1 });
		course.change(course.exercise, '    id: power', '    id: power\n    skill: nothing');
		await expect(course.run()).rejects.toMatchObject({
			file: `${course.slug}/${course.exercise}`,
			field: 'questions[0].skill',
			reason: 'nothing is no unit of this course'
		});
		expect(await course.editions()).toHaveLength(1);
	});

	it('keeps the glossary with the edition, marks its terms in lessons, and names what is wrong in it', async () => {
		const entry = { term: 'Marker', forms: ['markers'], definition: 'A point on a trace.', unit: 'spread' };
		course.write('glossary.yaml', [entry]);
		await course.run();
		const [edition] = await course.editions();
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
			course.write('glossary.yaml', entries);
			await expect(course.run()).rejects.toMatchObject({
				file: `${course.slug}/glossary.yaml`,
				field: expect.stringContaining(field) as string,
				message: expect.stringContaining(reason) as string
			});
		}
		expect(await course.editions()).toHaveLength(1);
	});

	it('publishes a course with its units, lessons and exercises', async () => {
		expect(await course.run()).toEqual([
			{ slug: course.slug, edition: 1, created: true, writtenAtDesk: false }
		]);
		const [edition] = await course.editions();
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
		expect(exercise).toMatchObject({ unitId: unit.id, number: 1, slug: course.exerciseSlug, tries: 3 });
		expect(exercise.definition).toEqual(exerciseDefinition({ slug: course.exerciseSlug }));
		expect(exercise.situationHtml.trim()).toBe(
			'<p>The lead loses <strong>{leadLossDb | 1} dB</strong>. Measure at the coupler’s port.</p>'
		);
	});

	it('makes no edition when nothing has changed, however often and by however many it is run', async () => {
		await Promise.all([course.run(), course.run(), course.run()]);
		expect(await course.run()).toEqual([
			{ slug: course.slug, edition: 1, created: false, writtenAtDesk: false }
		]);
		expect(await course.editions()).toHaveLength(1);
	});

	it('looks at no exercise again while the files are the same, nor at those that are, in a course that changed', async () => {
		await importContent({ root: 'content', now });
		const startedAt = performance.now();
		const again = await importContent({ root: 'content', now });
		// Checking one exercise alone takes longer than this.
		expect(performance.now() - startedAt).toBeLessThan(1000);
		expect(again.every(({ created }) => !created)).toBe(true);

		await course.run();
		const own = (await CheckedContent.findAll()).find(
			({ definition }) => definition?.slug === course.exerciseSlug
		);
		// Were the file checked again, this title would not be there.
		await own!.update({ definition: { ...own!.definition!, title: 'As it was checked' } });
		course.change(LESSON, 'slice', 'part');
		expect(await course.run()).toEqual([
			{ slug: course.slug, edition: 2, created: true, writtenAtDesk: false }
		]);
		const second = (await course.editions())[1];
		const [exercise] = await Exercise.findAll({ where: { editionId: second.id } });
		expect(exercise.title).toBe('As it was checked');
	});

	it('keeps the files an edition was made of, byte for byte, and fills them in for an edition that has none', async () => {
		await course.run();
		const [edition] = await course.editions();
		const filesOf = async () => {
			const files = await EditionFile.findAll({ where: { editionId: edition.id }, order: ['path'] });
			const contents = await FileContent.findAll({ where: { hash: files.map(({ hash }) => hash) } });
			return files.map(({ path: name, hash }) => [name, contents.find((one) => one.hash === hash)!.bytes]);
		};
		const asWritten = [LESSON, course.exercise, 'course.yaml'].map((name) => [
			name,
			readFileSync(course.path(name))
		]);
		expect(await filesOf()).toEqual(asWritten);
		await EditionFile.destroy({ where: { editionId: edition.id } });
		expect(await course.run()).toEqual([
			{ slug: course.slug, edition: 1, created: false, writtenAtDesk: false }
		]);
		expect(await filesOf()).toEqual(asWritten);
	});

	it('leaves a course alone that somebody has published at the desk since', async () => {
		await course.run();
		const [edition] = await course.editions();
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
		course.change(LESSON, 'slice', 'part');
		expect(await course.run()).toEqual([
			{ slug: course.slug, edition: 2, created: false, writtenAtDesk: true }
		]);
		expect(await course.editions()).toHaveLength(2);
	});

	it('publishes anew what goes back to what it was before the newest edition', async () => {
		await course.run();
		course.change(LESSON, 'slice', 'part');
		await course.run();
		course.change(LESSON, 'part', 'slice');
		expect(await course.run()).toEqual([
			{ slug: course.slug, edition: 3, created: true, writtenAtDesk: false }
		]);
	});

	it.each([
		['a lesson', '06-spread/lesson.md', 'slice', 'part'],
		['a figure', '06-spread/lesson.md', 'climbs', 'rises'],
		['an exercise', '', 'tries: 3', 'tries: 4'],
		['the course', 'course.yaml', 'From the quay.', 'From the pier.']
	])(
		'makes a new edition when %s has changed, and leaves the old one as it was',
		async (_, name, from, to) => {
			await course.run();
			const [before] = await course.editions();
			const old = await Exercise.findAll({ where: { editionId: before.id } });
			course.change(name || course.exercise, from, to);
			expect(await course.run()).toEqual([
				{ slug: course.slug, edition: 2, created: true, writtenAtDesk: false }
			]);
			const [first, second] = await course.editions();
			expect(first.get()).toEqual(before.get());
			expect(second.contentHash).not.toBe(first.contentHash);
			const kept = await Exercise.findAll({ where: { editionId: before.id } });
			expect(kept.map((row) => row.get())).toEqual(old.map((row) => row.get()));
		}
	);

	it('leaves the tables unchanged when it fails late', async () => {
		Exercise.addHook('afterBulkCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(course.run()).rejects.toThrow('late');
		Exercise.removeHook('afterBulkCreate', 'fail late');
		expect(await course.editions()).toEqual([]);
	});
});
