import { describe, expect, it } from 'vitest';
import { learnHome } from '$lib/schemas/course-view';
import { courseSkills } from '$lib/schemas/skill-view';
import { Attempt } from '$lib/server/db/models/attempt';
import { Exercise } from '$lib/server/db/models/exercise';
import { Unit } from '$lib/server/db/models/unit';
import type { Actor } from '$lib/server/domain/role';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { getExerciseBrief } from '$lib/server/services/courses/get-exercise-brief';
import { getLesson } from '$lib/server/services/courses/get-lesson';
import { getLearnHome } from '$lib/server/services/progress/get-learn-home';
import { listSkills } from '$lib/server/services/progress/list-skills';
import { createClosedAttempt } from '../../factories/closed-attempt';
import { createCourse } from '../../factories/course';
import { exerciseDefinition } from '../../factories/exercise';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const later = (days: number) => new Date(now.getTime() + days * 86_400_000);
const [first, second] = exerciseDefinition({}).questions.map(({ id }) => id);

/** A course whose second unit needs the first, with an exercise in each. */
async function createPath() {
	const { course, exercise } = await createCourse();
	const place = await Unit.findByPk(exercise.unitId, { rejectOnEmpty: true });
	const slugs = { first: `first-${course.id}`, second: `second-${course.id}` };
	await place.update({ slug: slugs.first, doneWith: 1 });
	const unit = await Unit.create({
		...{
			editionId: exercise.editionId,
			number: 7,
			slug: slugs.second,
			title: 'Second',
			summary: 'After it.'
		},
		...{ needs: [slugs.first], lesson: { title: 'Second', words: 0, parts: [] }, figures: [] }
	});
	const slug = `after-${exercise.slug}`;
	const definition = { ...exercise.definition, slug };
	await Exercise.create({
		...{ editionId: exercise.editionId, unitId: unit.id, number: 1, slug, title: 'After', tries: 3 },
		...{ definition, situationHtml: '' }
	});
	return { course, exercise, slugs, shut: slug };
}
const homeOf = async (actor: Actor, course: { slug: string }, at = now) => {
	const home = await getLearnHome(actor, at);
	expect(learnHome.parse(home)).toEqual(home);
	const found = home.courses.find(({ slug }) => slug === course.slug);
	if (!found) throw new Error('no course');
	return { ...home, course: found };
};

describe('a unit that needs another', () => {
	it('refuses to start its exercises, says what opens it, and leaves its lesson to read', async () => {
		const { actor } = await createUser('apprentice');
		const { course, slugs, shut } = await createPath();
		const refused = startAttempt(actor, shut, now);
		await expect(refused).rejects.toMatchObject({ code: 'conflict' });
		await expect(refused).rejects.toThrow('1 exercise right there opens this unit');
		expect(await Attempt.count({ where: { userId: actor.id } })).toBe(0);
		expect((await getExerciseBrief(actor, shut, now)).lock?.needs).toMatchObject([{ slug: slugs.first }]);
		expect(await getLesson(actor, slugs.second, now)).toMatchObject({ title: 'Second', lock: {} });
		const { course: shown } = await homeOf(actor, course);
		expect(shown.units.map(({ lock }) => lock === null)).toEqual([true, false]);
	});

	it('opens once enough is right, also in practice when the tries are used up', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise, shut } = await createPath();
		for (let i = 0; i < 3; i++) await createClosedAttempt(actor, exercise.slug, now, { passed: false });
		await expect(startAttempt(actor, shut, now)).rejects.toMatchObject({ code: 'conflict' });
		await createClosedAttempt(actor, exercise.slug, now, { passed: true, practice: true });
		expect((await startAttempt(actor, shut, now)).created).toBe(true);
	});

	it('holds neither instructors nor administrators', async () => {
		for (const role of ['instructor', 'administrator'] as const) {
			const { actor } = await createUser('apprentice', role);
			const { shut } = await createPath();
			expect((await startAttempt(actor, shut, now)).created).toBe(true);
		}
	});
});

describe('practice', () => {
	it('takes no try, never counts, and comes only when nothing else could count', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse({ tries: 1 });
		await expect(startAttempt(actor, exercise.slug, now, true)).rejects.toMatchObject({ code: 'conflict' });
		await createClosedAttempt(actor, exercise.slug, now, { passed: false });
		await expect(startAttempt(actor, exercise.slug, now)).rejects.toThrow('practice');
		await createClosedAttempt(actor, exercise.slug, now, { passed: true, practice: true });
		const { course: shown } = await homeOf(actor, course);
		expect(shown.units[0].exercises[0]).toMatchObject({
			standing: 'not-passed',
			triesLeft: 0,
			attempts: [
				{ practice: false, counts: false },
				{ practice: true, counts: false, number: 2 }
			]
		});
	});

	it('is started once, however many ask at once', async () => {
		const { actor } = await createUser('apprentice');
		const { exercise } = await createCourse({ tries: 1 });
		await createClosedAttempt(actor, exercise.slug, now, { passed: true });
		const all = await Promise.all(
			Array.from({ length: 10 }, () => startAttempt(actor, exercise.slug, now, true))
		);
		expect(all.filter(({ created }) => created)).toHaveLength(1);
		expect(all[0].attempt).toMatchObject({ practice: true, triesLeft: 0 });
	});
});

describe('getLearnHome(actor, now)', () => {
	it('brings back what was missed when its day has come, and a right answer then moves it on', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse({ tries: 1 });
		await createClosedAttempt(actor, exercise.slug, now, {
			passed: true,
			verdicts: { [first]: 'right', [second]: 'right-but-method' }
		});
		const repeatAt = async (at: Date) =>
			(await homeOf(actor, course, at)).course.units[0].exercises[0].repeat;
		expect(await repeatAt(now)).toMatchObject({ due: false, number: 1, of: 4 });
		expect(await homeOf(actor, course, later(1))).toMatchObject({ next: { kind: 'repeat' } });
		await createClosedAttempt(actor, exercise.slug, later(1), {
			passed: true,
			verdicts: { [first]: 'right', [second]: 'right' },
			practice: true
		});
		expect(await repeatAt(later(1))).toMatchObject({
			due: false,
			number: 2,
			dueAt: later(3.5).toISOString()
		});
	});

	it('leaves alone what had everything right', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise } = await createCourse();
		const verdicts = { [first]: 'right', [second]: 'right' };
		await createClosedAttempt(actor, exercise.slug, now, { passed: true, verdicts });
		expect((await homeOf(actor, course, later(9))).course.units[0].exercises[0].repeat).toBeNull();
	});
});

describe('listSkills(actor, now)', () => {
	it('makes each skill of its own questions’ answers, those left out too, and says what raises it', async () => {
		const { actor } = await createUser('apprentice');
		const { course, exercise, slugs } = await createPath();
		const questions = exercise.definition.questions.map((question, i) =>
			i === 1 ? { ...question, skill: slugs.second } : question
		);
		await exercise.update({ definition: { ...exercise.definition, questions } });
		await createClosedAttempt(actor, exercise.slug, now, { passed: false, verdicts: { [first]: 'right' } });
		await createClosedAttempt(actor, exercise.slug, later(1), {
			passed: true,
			verdicts: { [first]: 'right', [second]: 'right-but-method' }
		});
		const all = await listSkills(actor, now);
		for (const one of all) expect(courseSkills.parse(one)).toEqual(one);
		const skills = all.find((one) => one.course.slug === course.slug)?.skills;
		expect(skills).toMatchObject([
			{
				slug: slugs.first,
				level: 'on the way',
				worths: [1, 1],
				share: 1,
				raise: '2 answers right in a row: sure.'
			},
			{ slug: slugs.second, level: 'begun', worths: [0, 0.5] }
		]);
		expect(skills?.[0].exercise).toMatchObject({ slug: exercise.slug, practice: true });
		expect(skills?.[1].exercise).toMatchObject({ practice: false });
	});

	it('shows nothing of anybody else’s, and is closed to those who learn nothing here', async () => {
		const { actor } = await createUser('apprentice');
		const { actor: other } = await createUser('apprentice');
		const { course, exercise } = await createCourse();
		await createClosedAttempt(other, exercise.slug, now, { passed: true, verdicts: { [first]: 'right' } });
		const skills = (await listSkills(actor, now)).find((one) => one.course.slug === course.slug)?.skills;
		expect(skills?.[0]).toMatchObject({ level: 'not begun', worths: [], share: null });
		const { actor: coordinator } = await createUser('coordinator');
		await expect(listSkills(coordinator, now)).rejects.toMatchObject({ code: 'forbidden' });
	});
});
