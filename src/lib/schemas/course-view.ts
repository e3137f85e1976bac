/** What a learner is shown of a course and of an exercise before starting it. */
import { z } from 'zod';
import { receiverView } from './exercise-view';

export const attemptLine = z.strictObject({
	id: z.int(),
	number: z.int(),
	state: z.enum(['open', 'closed']),
	startedAt: z.iso.datetime(),
	closedAt: z.iso.datetime().nullable(),
	/** Null while it is open. */
	passed: z.boolean().nullable(),
	/** Questions it asked, answers handed in, and those of them that were right. */
	questions: z.int(),
	answered: z.int(),
	rightAnswers: z.int(),
	/** The best of them, which counts; none does before one is closed with a right answer. */
	counts: z.boolean()
});

export const exerciseProgress = z.strictObject({
	slug: z.string(),
	title: z.string(),
	/** Position in its unit, from 1. */
	number: z.int(),
	tries: z.int(),
	triesLeft: z.int(),
	/** The best counts: one passed attempt is a pass. */
	standing: z.enum(['not-started', 'open', 'passed', 'not-passed']),
	openAttemptId: z.int().nullable(),
	attempts: z.array(attemptLine)
});

export const unitProgress = z.strictObject({
	number: z.int(),
	slug: z.string(),
	title: z.string(),
	summary: z.string(),
	exercises: z.array(exerciseProgress)
});

export const courseProgress = z.strictObject({
	slug: z.string(),
	title: z.string(),
	summary: z.string(),
	edition: z.int(),
	units: z.array(unitProgress)
});

export const exerciseBrief = z.strictObject({
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	unit: z.strictObject({ number: z.int(), slug: z.string(), title: z.string() }),
	exercise: exerciseProgress,
	client: z.string(),
	receiver: receiverView,
	questions: z.int(),
	hints: z.int(),
	/** Receiver time the exercise allows, s of bench clock. */
	benchTimeS: z.number()
});

export type AttemptLineView = z.infer<typeof attemptLine>;
export type ExerciseProgress = z.infer<typeof exerciseProgress>;
export type UnitProgress = z.infer<typeof unitProgress>;
export type CourseProgress = z.infer<typeof courseProgress>;
export type ExerciseBrief = z.infer<typeof exerciseBrief>;
