import { describe, expect, it } from 'vitest';
import type { CourseProgress, ExerciseProgress, RepeatView } from '$lib/schemas/course-view';
import { lastFinding, nextStep } from '$lib/server/domain/progress/next-step';

const attempt = (id: number, passed: boolean | null, closedAt: string | null, number = id) => ({
	...{ id, number, passed, closedAt },
	state: closedAt === null ? ('open' as const) : ('closed' as const),
	startedAt: '2026-03-02T09:00:00Z',
	questions: 2,
	answered: closedAt === null ? 0 : 2,
	rightAnswers: passed ? 2 : 0,
	counts: passed === true,
	practice: false
});
const closed = (id: number, passed: boolean, at = '2026-03-02T10:00:00Z') => [attempt(id, passed, at)];
const exercise = (number: number, over: Partial<ExerciseProgress> = {}): ExerciseProgress => ({
	slug: `exercise-${number}`,
	title: `Exercise ${number}`,
	number,
	standing: 'not-started',
	tries: 3,
	triesLeft: 3,
	openAttemptId: null,
	repeat: null,
	attempts: [],
	...over
});
const passed = (number: number, over: Partial<ExerciseProgress> = {}) =>
	exercise(number, { standing: 'passed', attempts: closed(number, true), ...over });
const unit = (number: number, exercises: ExerciseProgress[], lock: string | null = null) => ({
	number,
	slug: `unit-${number}`,
	title: `Name ${number}`,
	summary: 'S',
	lock: lock === null ? null : { text: lock, needs: [] },
	exercises
});
const course = (...units: CourseProgress['units']): CourseProgress[] => [
	{ slug: 'c', title: 'C', summary: 'S', edition: 1, units }
];
const repeat = (dueAt: string, due: boolean): RepeatView => ({
	...{ dueAt, due },
	missedAt: '2026-03-02T10:00:00Z',
	number: 1,
	of: 4
});

describe('nextStep(courses)', () => {
	it('begins with the first lesson, and with a way straight to its exercise', () => {
		const step = nextStep(course(unit(1, [exercise(1), exercise(2)])));
		expect(step).toMatchObject({
			kind: 'lesson',
			href: '/learn/units/unit-1',
			why: 'The course begins here.',
			also: { href: '/learn/exercises/exercise-1' }
		});
	});

	it('goes on with what is open before anything else', () => {
		const open = exercise(2, { standing: 'open', openAttemptId: 9, attempts: [attempt(9, null, null, 1)] });
		const due = passed(1, { repeat: repeat('2026-03-03T10:00:00Z', true) });
		const step = nextStep(course(unit(1, [due, open])));
		expect(step).toMatchObject({ kind: 'go-on', href: '/learn/attempts/9' });
		expect(step.why).toContain('first attempt is open');
	});

	it('then repeats what is due, the longest due first, and says when it was missed', () => {
		const step = nextStep(
			course(
				unit(1, [
					passed(1, { repeat: repeat('2026-03-05T10:00:00Z', true) }),
					passed(2, { repeat: repeat('2026-03-03T10:00:00Z', true) }),
					exercise(3)
				])
			)
		);
		expect(step).toMatchObject({ kind: 'repeat', href: '/learn/exercises/exercise-2' });
		expect(step.why).toContain('missed it on 2 March');
		expect(step.why).toContain('1, 3, 7 and 21 days');
	});

	it('leaves what is not due yet, and what stands in a shut unit', () => {
		const later = passed(1, { repeat: repeat('2026-03-05T10:00:00Z', false) });
		expect(nextStep(course(unit(1, [later, exercise(2)]))).kind).toBe('exercise');
		const shut = unit(
			2,
			[passed(3, { repeat: repeat('2026-03-03T10:00:00Z', true) })],
			'First comes unit 1.'
		);
		expect(nextStep(course(unit(1, [passed(1), exercise(2)]), shut))).toMatchObject({ kind: 'exercise' });
	});

	it('goes on in the unit that was worked in last, and says what it follows', () => {
		const step = nextStep(course(unit(1, [exercise(1)]), unit(2, [passed(2), exercise(3)])));
		expect(step).toMatchObject({ kind: 'exercise', href: '/learn/exercises/exercise-3' });
		expect(step.why).toBe('It follows Exercise 2, which you have right.');
	});

	it('stays with what was not right while a try is left, and says how many', () => {
		const failed = exercise(1, { standing: 'not-passed', triesLeft: 1, attempts: closed(1, false) });
		const step = nextStep(course(unit(1, [failed, exercise(2)])));
		expect(step).toMatchObject({ href: '/learn/exercises/exercise-1', act: 'Try it again' });
		expect(step.why).toContain('1 try is left');
	});

	it('goes to the next lesson when a unit is done, and never to a unit that is shut', () => {
		const shut = unit(2, [exercise(2)], 'First comes unit 1.');
		const step = nextStep(course(unit(1, [passed(1)]), shut, unit(3, [exercise(3)])));
		expect(step).toMatchObject({ kind: 'lesson', href: '/learn/units/unit-3' });
		expect(step.why).toContain('unit 1');
	});

	it('says when there is nothing more, when the next repeat is due, and who can help', () => {
		expect(nextStep(course(unit(1, [passed(1)])))).toMatchObject({ kind: 'done', href: null });
		const later = passed(1, { repeat: repeat('2026-03-05T10:00:00Z', false) });
		const waiting = nextStep(course(unit(1, [later])));
		expect(waiting.kind).toBe('wait');
		expect(waiting.why).toContain('5 March');
		const spent = exercise(1, { standing: 'not-passed', triesLeft: 0, attempts: closed(1, false) });
		expect(nextStep(course(unit(1, [spent])))).toMatchObject({
			kind: 'stuck',
			why: expect.stringContaining('instructor') as string
		});
	});
});

describe('lastFinding(courses)', () => {
	it('is that of the attempt closed last, and never of one without a finding', () => {
		const courses = course(
			unit(1, [
				exercise(1, {
					attempts: [attempt(1, true, '2026-03-02T10:00:00Z'), attempt(2, null, '2026-03-02T12:00:00Z')]
				}),
				exercise(2, { attempts: [attempt(3, false, '2026-03-02T11:00:00Z'), attempt(4, null, null)] })
			])
		);
		expect(lastFinding(courses)?.attempt.number).toBe(3);
		expect(lastFinding(course(unit(1, [exercise(1)])))).toBeNull();
	});
});
