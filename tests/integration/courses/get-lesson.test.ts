import { describe, expect, it } from 'vitest';
import { glossaryView } from '$lib/schemas/glossary';
import { lessonView } from '$lib/schemas/lesson-view';
import { Edition } from '$lib/server/db/models/edition';
import { Unit } from '$lib/server/db/models/unit';
import { getLesson } from '$lib/server/services/courses/get-lesson';
import { listGlossary } from '$lib/server/services/glossary/list-glossary';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { createCourse, createEdition } from '../../factories/course';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
let made = 0;

/** A course whose only unit has a name that nobody else's has. */
async function course() {
	const { course, exercise } = await createCourse();
	const slug = `unit-under-test-${(made += 1)}`;
	await Unit.update({ slug }, { where: { id: exercise.unitId } });
	return { course, exercise, slug };
}

describe('getLesson(actor, slug)', () => {
	it('shows the lesson with its figures drawn, the exercises with their standing, and nothing of any scene', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise, slug } = await course();
		await startAttempt(actor, exercise.slug, now);
		const lesson = await getLesson(actor, slug, now);
		expect(lessonView.parse(lesson)).toEqual(lesson);
		expect(lesson).toMatchObject({ title: 'Why a marker misleads', before: null, after: null });
		expect(lesson.exercises).toMatchObject([{ slug: exercise.slug, standing: 'open' }]);
		expect(lesson.parts.map(({ kind }) => kind)).toEqual(['text', 'figure']);
		const [, part] = lesson.parts;
		if (part.kind !== 'figure') throw new Error('no figure');
		expect(part.figure.start.traces[0].levelsDbm).toHaveLength(201);
		expect(JSON.stringify(lesson)).not.toMatch(/emitters|symbolRateHz|seed|truth|mistake/);
	});

	it('brings the definitions of the terms that are marked in it, and the glossary lists them all', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise, slug } = await course();
		const written = { definition: 'In plain words.', forms: [], unit: slug };
		const glossary = [
			{ ...written, slug: 'marker', term: 'Marker' },
			{ ...written, slug: 'peak', term: 'Peak', source: 'computed' }
		];
		await Edition.update({ glossary }, { where: { id: exercise.editionId } });
		const unit = await Unit.findByPk(exercise.unitId, { rejectOnEmpty: true });
		const html = '<p>A <a class="term" href="/learn/glossary#marker" data-term="marker">marker</a>.</p>';
		await unit.update({ lesson: { ...unit.lesson, parts: [{ kind: 'text', html }] } });
		const lesson = await getLesson(actor, slug, now);
		expect(lessonView.parse(lesson)).toEqual(lesson);
		expect(lesson.terms).toEqual([{ slug: 'marker', term: 'Marker', definition: 'In plain words.' }]);
		const listed = (await listGlossary(actor)).find(({ terms }) => terms.at(0)?.unit.slug === slug);
		expect(glossaryView.parse(listed)).toEqual(listed);
		expect(listed?.terms.map(({ term, source }) => [term, source])).toEqual([
			['Marker', null],
			['Peak', 'computed']
		]);
		const { actor: coordinator } = await createUser('coordinator');
		await expect(listGlossary(coordinator)).rejects.toMatchObject({ code: 'forbidden' });
	});

	it('names the units around it', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise, slug } = await course();
		const unit = await Unit.findByPk(exercise.unitId);
		if (!unit) throw new Error('no unit');
		for (const number of [5, 7, 8])
			await Unit.create({
				...unit.get(),
				id: undefined,
				number,
				slug: `${slug}-${number}`,
				title: `T${number}`
			});
		expect(await getLesson(actor, slug, now)).toMatchObject({
			before: { number: 5, title: 'T5' },
			after: { number: 7, title: 'T7' }
		});
	});

	it('is open to instructors, closed to those who learn nothing here, and knows no unit that is gone', async () => {
		const as = async (role: Parameters<typeof createUser>[0]) => (await createUser(role)).actor;
		const { course: parent, slug } = await course();
		expect((await getLesson(await as('instructor'), slug, now)).unit.slug).toBe(slug);
		await expect(getLesson(await as('coordinator'), slug, now)).rejects.toMatchObject({ code: 'forbidden' });
		await expect(getLesson(await as('apprentice'), 'nothing', now)).rejects.toMatchObject({
			code: 'not_found'
		});
		await createEdition(parent, 2, { slug: `later-${slug}` });
		await expect(getLesson(await as('apprentice'), slug, now)).rejects.toMatchObject({ code: 'not_found' });
	});
});
