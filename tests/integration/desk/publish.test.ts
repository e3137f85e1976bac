import { beforeEach, describe, expect, it, vi } from 'vitest';
import { Attempt } from '$lib/server/db/models/attempt';
import { Edition } from '$lib/server/db/models/edition';
import { EditionFile } from '$lib/server/db/models/edition-file';
import { Exercise } from '$lib/server/db/models/exercise';
import { ExerciseProof } from '$lib/server/db/models/exercise-proof';
import { hashOfExercise } from '$lib/server/content/content-hash';
import type { Actor } from '$lib/server/domain/role';
import type { ProofResult } from '$lib/schemas/proof-view';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { changeOutline } from '$lib/server/services/course-drafts/change-outline';
import { getDraftFile } from '$lib/server/services/course-drafts/get-draft-file';
import { publishDraft } from '$lib/server/services/course-drafts/publish-draft';
import { saveDraftFile } from '$lib/server/services/course-drafts/save-draft-file';
import { startDraft } from '$lib/server/services/course-drafts/start-draft';
import { viewDraft } from '$lib/server/services/course-drafts/view-draft';
import { createUser } from '../../factories/user';
import { createWrittenCourse } from '../../factories/written-course';

// Threads start from the sources here.
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

const now = new Date('2026-03-03T09:00:00Z');
let author: Actor;
let course: Awaited<ReturnType<typeof createWrittenCourse>>;

beforeEach(async () => {
	author = (await createUser('instructor')).actor;
	course = await createWrittenCourse();
	await startDraft(author, course.slug, now);
});

const publish = () => publishDraft(author, course.slug, now);
async function change(path: string, from: string, to: string): Promise<string> {
	const { text, revision } = await getDraftFile(author, course.slug, path);
	const changed = text.replace(from, to);
	expect(changed).not.toBe(text);
	await saveDraftFile(author, course.slug, { path, text: changed, revision }, now);
	return changed;
}
const prove = (text: string, passed = true) =>
	ExerciseProof.create({
		...{ hash: hashOfExercise(text), seeds: 200, passed, madeAt: now, tookMs: 1 },
		result: { passed } as ProofResult
	});
const editions = async () => {
	const { editionId } = (await Exercise.findOne({ where: { slug: course.exercise } }))!;
	const { courseId } = (await Edition.findByPk(editionId))!;
	return Edition.findAll({ where: { courseId }, order: ['number'] });
};

describe('publishDraft(actor, slug, now)', () => {
	it('refuses an exercise that isn’t proven, by name, and publishes it once it is', async () => {
		const text = await change(course.exercisePath, 'tries: 5', 'tries: 4');
		await expect(publish()).rejects.toMatchObject({
			code: 'invalid',
			issues: [{ field: course.exercisePath, message: 'is not proven' }]
		});
		await prove(text, false);
		await expect(publish()).rejects.toMatchObject({ issues: [{ message: 'its proof has failed' }] });
		expect(await editions()).toHaveLength(1);
		await ExerciseProof.destroy({ where: {} });
		await prove(text);
		expect((await viewDraft(author, course.slug)).units[0].exercises[0].state).toBe('proven');
		expect(await publish()).toBe(2);
		const view = await viewDraft(author, course.slug);
		expect(view).toMatchObject({ newest: { number: 2 }, changes: [], unproven: [] });
		expect(view.units[0].exercises[0].state).toBe('published');
	});

	it('makes an edition with the draft’s files, whoever is at an attempt keeps the old one', async () => {
		const apprentice = (await createUser('apprentice')).actor;
		const { attempt } = await startAttempt(apprentice, course.exercise, now);
		await change(course.lessonPath, 'slice', 'part');
		await changeOutline(author, course.slug, { do: 'add-unit', title: 'Next', summary: 'More.' }, now);
		const { changes } = await viewDraft(author, course.slug);
		expect(changes.map(({ path, what }) => [path, what])).toEqual([
			[course.lessonPath, 'changed'],
			['04-next/lesson.md', 'added'],
			['course.yaml', 'changed']
		]);
		expect(await publish()).toBe(2);
		const [first, second] = await editions();
		expect(second.publishedBy).toBe(author.id);
		expect(await EditionFile.count({ where: { editionId: second.id } })).toBe(4);
		expect((await Attempt.findByPk(attempt.id))!.editionId).toBe(first.id);
		const other = (await createUser('apprentice')).actor;
		const later = await startAttempt(other, course.exercise, now);
		expect((await Attempt.findByPk(later.attempt.id))!.editionId).toBe(second.id);
	});

	it('names every fault and every link that leads nowhere, and publishes nothing', async () => {
		await change(course.lessonPath, 'So it does.', 'See [there](/learn/units/nowhere).');
		await expect(publish()).rejects.toMatchObject({
			issues: [{ message: 'the link /learn/units/nowhere: there is no such unit' }]
		});
		await change(course.lessonPath, 'seed: 7', 'sead: 7');
		await change(course.exercisePath, 'receiver: field', 'receiver: grand');
		await expect(publish()).rejects.toMatchObject({
			issues: [{ field: course.lessonPath }, { field: course.exercisePath }]
		});
		expect(await editions()).toHaveLength(1);
	});

	it('refuses to publish what the newest edition holds already', async () => {
		await expect(publish()).rejects.toMatchObject({ code: 'conflict' });
	});

	it('makes no edition when it fails late', async () => {
		await change(course.lessonPath, 'slice', 'part');
		EditionFile.addHook('beforeBulkCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(publish()).rejects.toThrow('late');
		EditionFile.removeHook('beforeBulkCreate', 'fail late');
		expect(await editions()).toHaveLength(1);
	});
});
