import { expect, it } from 'vitest';
import { peopleOverview, serverState, teachOverview } from '$lib/schemas/overview';
import { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { getCompanyOverview, getPeopleOverview } from '$lib/server/services/overviews/get-people-overview';
import { getServerState } from '$lib/server/services/overviews/get-server-state';
import { getTeachOverview } from '$lib/server/services/overviews/get-teach-overview';
import { createCourse } from '../../factories/course';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');

async function closeAs(attemptId: number, passed: boolean, at: Date) {
	await Attempt.update({ closedAt: at }, { where: { id: attemptId } });
	const finding = { questions: [], log: [], doneRight: [], passed };
	await Finding.create({ attemptId, passed, finding, engineVersion: 1, gradedAt: at });
}

it('an instructor is told who is at the bench, what was handed in, and what fails most, without names that are not theirs to see', async () => {
	const { actor: instructor } = await createUser('instructor');
	const { actor: learner } = await createUser('apprentice');
	const { exercise } = await createCourse();
	const { attempt } = await startAttempt(learner, exercise.slug, now);
	const during = teachOverview.parse(await getTeachOverview(instructor, now));
	expect(during.atBench).toMatchObject([{ attemptId: attempt.id, name: null, number: 1, passed: null }]);
	expect(during.latest).toEqual([]);
	const hourLater = new Date(now.getTime() + 3_600_000);
	expect((await getTeachOverview(instructor, hourLater)).atBench).toEqual([]);
	await closeAs(attempt.id, false, now);
	const after = teachOverview.parse(await getTeachOverview(instructor, now));
	expect(after.atBench).toEqual([]);
	expect(after.latest).toMatchObject([{ attemptId: attempt.id, name: null, passed: false }]);
	expect(after.exercises.find(({ slug }) => slug === exercise.slug)).toMatchObject({
		people: 1,
		closed: 1,
		passed: 0,
		open: 0
	});
});

it('a coordinator and an administrator are told everybody’s progress', async () => {
	const { actor: coordinator } = await createUser('coordinator');
	const { actor: admin } = await createUser('administrator');
	const { actor: learner } = await createUser('apprentice');
	const { exercise } = await createCourse();
	for (const passed of [false, true]) {
		const { attempt } = await startAttempt(learner, exercise.slug, now);
		await closeAs(attempt.id, passed, now);
	}
	for (const actor of [coordinator, admin]) {
		const { people, courses } = peopleOverview.parse(await getPeopleOverview(actor));
		expect(people.find(({ id }) => id === learner.id)).toMatchObject({ attempts: 2, passed: 1 });
		expect(courses.length).toBeGreaterThan(0);
	}
	const state = serverState.parse(await getServerState(admin, now));
	expect(state.node).toBe(process.versions.node);
	expect(state.database).toMatch(/MariaDB/);
});

it('nobody else gets in', async () => {
	const { actor: learner } = await createUser('apprentice');
	const { actor: contact } = await createUser('company-contact');
	await expect(getPeopleOverview(learner)).rejects.toMatchObject({ code: 'forbidden' });
	await expect(getTeachOverview(contact, now)).rejects.toMatchObject({ code: 'forbidden' });
	await expect(getServerState(contact, now)).rejects.toMatchObject({ code: 'forbidden' });
	await expect(getCompanyOverview(learner)).rejects.toMatchObject({ code: 'forbidden' });
});
