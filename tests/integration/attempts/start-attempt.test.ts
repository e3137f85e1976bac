import { describe, expect, it } from 'vitest';
import { attemptView } from '$lib/schemas/attempt';
import { sequelize } from '$lib/server/db/connection';
import { Attempt } from '$lib/server/db/models/attempt';
import { Exercise } from '$lib/server/db/models/exercise';
import { DomainError } from '$lib/server/errors';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { createCourse, createEdition } from '../../factories/course';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00.123Z');
const close = (id: number) => Attempt.update({ closedAt: now }, { where: { id } });

describe('startAttempt(actor, slug, now)', () => {
	it('gives each attempt 128 random bits as its seed, and names exercise and edition', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse();
		const { attempt, created } = await startAttempt(actor, exercise.slug, now);
		const stored = await Attempt.findByPk(attempt.id, { rejectOnEmpty: true });
		expect(created).toBe(true);
		expect(stored.seed).toMatch(/^[0-9a-f]{32}$/);
		expect(stored).toMatchObject({
			userId: actor.id,
			exerciseId: exercise.id,
			editionId: exercise.editionId,
			number: 1,
			closedAt: null,
			startedAt: now
		});
		expect(attemptView.parse(attempt)).toEqual(attempt);
	});

	it('gives back the attempt that is still open, so that a second click spends no try', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse();
		const first = await startAttempt(actor, exercise.slug, now);
		const second = await startAttempt(actor, exercise.slug, now);
		expect(second).toEqual({ attempt: first.attempt, created: false });
	});

	it('starts no more than the tries allowed, however many ask at once', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse({ tries: 2 });
		for (let number = 1; number <= 2; number++) {
			const all = await Promise.all(
				Array.from({ length: 20 }, () => startAttempt(actor, exercise.slug, now))
			);
			expect(all.filter(({ created }) => created)).toHaveLength(1);
			expect(new Set(all.map(({ attempt }) => attempt.id)).size).toBe(1);
			expect(all[0].attempt).toMatchObject({ number, triesLeft: 2 - number });
			await close(all[0].attempt.id);
		}
		const refused = await Promise.allSettled(
			Array.from({ length: 20 }, () => startAttempt(actor, exercise.slug, now))
		);
		expect(refused.every(({ status }) => status === 'rejected')).toBe(true);
		expect(await Attempt.count({ where: { userId: actor.id } })).toBe(2);
	});

	it('draws a fresh seed for every try', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse();
		const first = await startAttempt(actor, exercise.slug, now);
		await close(first.attempt.id);
		const second = await startAttempt(actor, exercise.slug, now);
		const seeds = await Attempt.findAll({ where: { userId: actor.id }, attributes: ['seed'] });
		expect(second.attempt.number).toBe(2);
		expect(new Set(seeds.map(({ seed }) => seed)).size).toBe(2);
	});

	it('counts tries over editions, and starts in the newest one', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse({ tries: 2 });
		await close((await startAttempt(actor, exercise.slug, now)).attempt.id);
		const newer = await createEdition(course, 2, { slug: exercise.slug, tries: 2 });
		const { attempt } = await startAttempt(actor, exercise.slug, now);
		expect(attempt).toMatchObject({ number: 2, triesLeft: 0 });
		expect(await Attempt.findByPk(attempt.id)).toMatchObject({ exerciseId: newer.id });
	});

	it('knows no exercise that the newest edition has dropped', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse();
		await createEdition(course, 2, { slug: `${exercise.slug}-renamed` });
		await expect(startAttempt(actor, exercise.slug, now)).rejects.toMatchObject({ code: 'not_found' });
	});

	it('is refused to those who do no exercises', async () => {
		const { actor } = await createUser('coordinator');
		const { exercise } = await createCourse();
		const refused = startAttempt(actor, exercise.slug, now);
		await expect(refused).rejects.toBeInstanceOf(DomainError);
		await expect(refused).rejects.toMatchObject({ code: 'forbidden' });
	});

	it('leaves nothing behind when it fails late', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse();
		// The view, made last, can't be drawn from a definition without questions.
		await Exercise.update(
			{ definition: { ...exercise.definition, questions: null as never } },
			{ where: { id: exercise.id } }
		);
		await expect(startAttempt(actor, exercise.slug, now)).rejects.toThrow();
		expect(await Attempt.count({ where: { userId: actor.id } })).toBe(0);
	});

	it('is backed by the database: one open attempt a person and exercise, one of each number', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse();
		await startAttempt(actor, exercise.slug, now);
		const again = (number: number) =>
			sequelize.query(
				`INSERT INTO attempts (user_id, edition_id, exercise_id, number, seed, engine_version, started_at)
				VALUES (:user, :edition, :exercise, :number, REPEAT('0', 32), 1, NOW(3))`,
				{ replacements: { user: actor.id, edition: exercise.editionId, exercise: exercise.id, number } }
			);
		await expect(again(2)).rejects.toThrow(/attempts_one_open|Validation/);
		await close((await Attempt.findOne({ where: { userId: actor.id }, rejectOnEmpty: true })).id);
		await expect(again(1)).rejects.toThrow();
	});
});
