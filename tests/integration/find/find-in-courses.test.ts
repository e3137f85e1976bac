import { describe, expect, it } from 'vitest';
import { findView, longestQuery } from '$lib/schemas/find-view';
import { Edition } from '$lib/server/db/models/edition';
import { Unit } from '$lib/server/db/models/unit';
import { findInCourses } from '$lib/server/services/find/find-in-courses';
import { createCourse, createEdition } from '../../factories/course';
import { createUser } from '../../factories/user';

describe('findInCourses(actor, query)', () => {
	it('finds terms, exercises and places in lessons of the newest edition, and says so when there is nothing', async () => {
		const { actor } = await createUser('apprentice');
		const { course } = await createCourse({ title: 'Old zeppelin' });
		const exercise = await createEdition(course, 2, {
			slug: `zeppelin-${course.id}`,
			title: 'Zeppelin over the quay'
		});
		const glossary = [
			{
				slug: 'airship',
				term: 'Airship',
				forms: ['zeppelin'],
				definition: 'Lighter than air.',
				unit: 'spread-z'
			}
		];
		await Edition.update({ glossary }, { where: { id: exercise.editionId } });
		const unit = await Unit.findByPk(exercise.unitId, { rejectOnEmpty: true });
		const html = '<p>Opening.</p><h2 id="part-1">Above &amp; beyond</h2><p>A zeppelin<br>reflects.</p>';
		await unit.update({ slug: 'spread-z', lesson: { ...unit.lesson, parts: [{ kind: 'text', html }] } });
		const found = await findInCourses(actor, 'zeppelin');
		expect(findView.parse(found)).toEqual(found);
		expect(found.results.map(({ kind, href }) => [kind, href])).toEqual([
			['exercise', `/learn/exercises/${exercise.slug}`],
			['term', '/learn/glossary#airship'],
			['lesson', '/learn/units/spread-z#part-1']
		]);
		expect(found.results[2].title.map(({ text }) => text).join('')).toBe('Above & beyond');
		expect(await findInCourses(actor, 'zeppelin submarine')).toMatchObject({ total: 0, results: [] });
		expect((await findInCourses(actor, 'z'.repeat(500))).query).toHaveLength(longestQuery);
	});

	it('is closed to those who learn nothing here', async () => {
		const { actor } = await createUser('company-contact');
		await expect(findInCourses(actor, 'pad')).rejects.toMatchObject({ code: 'forbidden' });
	});
});
