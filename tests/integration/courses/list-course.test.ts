import { describe, expect, it } from 'vitest';
import { courseProgress, exerciseBrief } from '$lib/schemas/course-view';
import { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { getExerciseBrief } from '$lib/server/services/courses/get-exercise-brief';
import { listCourse, listCourses } from '$lib/server/services/courses/list-course';
import { createCourse, createEdition } from '../../factories/course';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');

async function closeAs(attemptId: number, passed: boolean) {
	await Attempt.update({ closedAt: now }, { where: { id: attemptId } });
	const finding = { questions: [], log: [], doneRight: [], passed };
	await Finding.create({ attemptId, passed, finding, engineVersion: 1, gradedAt: now });
}

describe('listCourse(actor, slug)', () => {
	it('shows units and exercises with what this person has done, and the best counts', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse();
		const standing = async () => {
			const view = await listCourse(actor, course.slug, now);
			expect(courseProgress.parse(view)).toEqual(view);
			return view.units[0].exercises[0];
		};
		expect(await standing()).toMatchObject({ standing: 'not-started', triesLeft: 3, attempts: [] });
		const { attempt: first } = await startAttempt(actor, exercise.slug, now);
		expect(await standing()).toMatchObject({ standing: 'open', openAttemptId: first.id, triesLeft: 2 });
		await closeAs(first.id, false);
		expect(await standing()).toMatchObject({ standing: 'not-passed', openAttemptId: null });
		const { attempt: second } = await startAttempt(actor, exercise.slug, now);
		await closeAs(second.id, true);
		const { attempt: third } = await startAttempt(actor, exercise.slug, now);
		await closeAs(third.id, false);
		expect(await standing()).toMatchObject({
			standing: 'passed',
			triesLeft: 0,
			attempts: [{ number: 1, passed: false }, { number: 2, passed: true, state: 'closed' }, { number: 3 }]
		});
	});

	it('shows nobody else’s attempts', async () => {
		const { actor } = await createUser('apprentice');
		const { actor: other } = await createUser('apprentice');
		const { course, exercise } = await createCourse();
		await startAttempt(other, exercise.slug, now);
		const { units } = await listCourse(actor, course.slug, now);
		expect(units[0].exercises[0]).toMatchObject({ standing: 'not-started', attempts: [] });
	});

	it('shows the newest edition, with attempts at earlier ones', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse();
		await startAttempt(actor, exercise.slug, now);
		await createEdition(course, 2, { slug: exercise.slug, title: 'Renamed' });
		const view = (await listCourses(actor, now)).find(({ slug }) => slug === course.slug);
		expect(view).toMatchObject({
			edition: 2,
			units: [{ exercises: [{ title: 'Renamed', standing: 'open' }] }]
		});
	});

	it('knows no course that is not there, and is closed to those who learn nothing here', async () => {
		const { actor } = await createUser('apprentice');
		const { actor: coordinator } = await createUser('coordinator');
		const { course } = await createCourse();
		await expect(listCourse(actor, 'no-such-course', now)).rejects.toMatchObject({ code: 'not_found' });
		await expect(listCourse(coordinator, course.slug, now)).rejects.toMatchObject({ code: 'forbidden' });
		await expect(listCourses(coordinator, now)).rejects.toMatchObject({ code: 'forbidden' });
	});
});

describe('getExerciseBrief(actor, slug)', () => {
	it('says what the exercise is, and nothing that a seed decides', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse();
		const brief = await getExerciseBrief(actor, exercise.slug, now);
		expect(exerciseBrief.parse(brief)).toEqual(brief);
		expect(brief).toMatchObject({
			client: 'Northmoor Telemetry',
			questions: ['number', 'number'],
			hints: 2,
			receiver: { name: 'field' },
			exercise: { standing: 'not-started' }
		});
		expect(JSON.stringify(brief)).not.toMatch(/carrierDbm|mistake|truth|scene|method/);
	});

	it('knows no exercise that is not published', async () => {
		const { actor } = await createUser('apprentice');
		await expect(getExerciseBrief(actor, 'nothing', now)).rejects.toMatchObject({ code: 'not_found' });
	});
});
