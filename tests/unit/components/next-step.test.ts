import { describe, expect, it } from 'vitest';
import { lastFinding, nextStep } from '$lib/components/course/next-step';
import type { CourseProgress, ExerciseProgress } from '$lib/schemas/course-view';

const attempt = (number: number, passed: boolean | null, closedAt: string | null) => ({
	id: number,
	number,
	state: closedAt === null ? ('open' as const) : ('closed' as const),
	startedAt: '2026-03-02T09:00:00Z',
	closedAt,
	passed,
	questions: 2,
	answered: closedAt === null ? 0 : 2,
	rightAnswers: passed ? 2 : 0,
	counts: passed === true
});
const exercise = (number: number, over: Partial<ExerciseProgress>) =>
	({
		slug: `exercise-${number}`,
		title: `Exercise ${number}`,
		number,
		standing: 'not-started',
		triesLeft: 3,
		openAttemptId: null,
		attempts: [],
		...over
	}) as ExerciseProgress;
const course = (...exercises: ExerciseProgress[]) =>
	[
		{
			slug: 'c',
			title: 'C',
			summary: 'S',
			units: [{ number: 1, slug: 'u', title: 'U', summary: 'S', exercises }]
		}
	] as unknown as CourseProgress[];

describe('nextStep(courses)', () => {
	it('begins where the course begins', () => {
		const { exercise: next, why } = nextStep(course(exercise(1, {}), exercise(2, {})));
		expect(next?.exercise.slug).toBe('exercise-1');
		expect(why).toBe('The course begins here.');
	});

	it('goes on to the one after what is right, and says so', () => {
		const { exercise: next, why } = nextStep(course(exercise(1, { standing: 'passed' }), exercise(2, {})));
		expect(next?.exercise.slug).toBe('exercise-2');
		expect(why).toContain('Exercise 1');
	});

	it('stays with what was not right while a try is left, and says how many', () => {
		const failed = {
			standing: 'not-passed' as const,
			triesLeft: 1,
			attempts: [attempt(1, false, '2026-03-02T10:00:00Z')]
		};
		const { exercise: next, why } = nextStep(course(exercise(1, failed), exercise(2, {})));
		expect(next?.exercise.slug).toBe('exercise-1');
		expect(why).toContain('1 try is left');
	});

	it('passes over what has no try left, and says when there is nothing more', () => {
		const spent = { standing: 'not-passed' as const, triesLeft: 0 };
		expect(nextStep(course(exercise(1, spent), exercise(2, {}))).exercise?.exercise.slug).toBe('exercise-2');
		expect(nextStep(course(exercise(1, spent)))).toMatchObject({
			exercise: null,
			why: expect.stringContaining('instructor') as string
		});
		expect(nextStep(course(exercise(1, { standing: 'open' })))).toMatchObject({ exercise: null });
		expect(nextStep(course(exercise(1, { standing: 'passed' }))).why).toContain('Every exercise');
	});
});

describe('lastFinding(courses)', () => {
	it('is that of the attempt closed last, and never of one given up', () => {
		const courses = course(
			exercise(1, {
				attempts: [attempt(1, true, '2026-03-02T10:00:00Z'), attempt(2, null, '2026-03-02T12:00:00Z')]
			}),
			exercise(2, { attempts: [attempt(3, false, '2026-03-02T11:00:00Z'), attempt(4, null, null)] })
		);
		expect(lastFinding(courses)?.attempt.number).toBe(3);
		expect(lastFinding(course(exercise(1, {})))).toBeNull();
	});
});
