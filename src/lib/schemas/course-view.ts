/** What a learner is shown of a course and of an exercise before starting it. */
import { z } from 'zod';
import { receiverView } from './exercise-view';
import { questionTypes } from './questions/question';

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
	counts: z.boolean(),
	/** Begun when the exercise was right or its tries were used: it takes no try and never counts. */
	practice: z.boolean()
});

/** What was missed and comes back. */
export const repeatView = z.strictObject({
	missedAt: z.iso.datetime(),
	dueAt: z.iso.datetime(),
	due: z.boolean(),
	/** The first, second … of so many repeats. */
	number: z.int(),
	of: z.int()
});

/** What holds a unit shut: in one sentence, and the units to do first. */
export const lockView = z.strictObject({
	text: z.string(),
	needs: z.array(z.strictObject({ number: z.int(), slug: z.string(), title: z.string() }))
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
	/** Null when nothing of it is to be repeated. */
	repeat: repeatView.nullable(),
	attempts: z.array(attemptLine)
});

export const unitProgress = z.strictObject({
	number: z.int(),
	slug: z.string(),
	title: z.string(),
	summary: z.string(),
	/** Null when it is open to this person. */
	lock: lockView.nullable(),
	exercises: z.array(exerciseProgress)
});

export const courseProgress = z.strictObject({
	slug: z.string(),
	title: z.string(),
	summary: z.string(),
	edition: z.int(),
	units: z.array(unitProgress)
});

/** The one thing to do next, and why. */
export const nextStep = z.strictObject({
	kind: z.enum(['go-on', 'repeat', 'exercise', 'lesson', 'wait', 'stuck', 'done']),
	/** Null when there is nothing to begin; `number` is null for a lesson. */
	place: z
		.strictObject({
			unit: z.strictObject({ number: z.int(), title: z.string() }),
			number: z.int().nullable(),
			title: z.string()
		})
		.nullable(),
	why: z.string(),
	/** Where it is done, and what its button says. */
	href: z.string().nullable(),
	act: z.string().nullable(),
	/** Another way to the same end. */
	also: z.strictObject({ href: z.string(), text: z.string() }).nullable()
});

/** A learner's home. */
export const learnHome = z.strictObject({
	courses: z.array(courseProgress),
	next: nextStep,
	/** The finding that was given last. */
	last: z.strictObject({ exerciseTitle: z.string(), attempt: attemptLine }).nullable()
});

export const exerciseBrief = z.strictObject({
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	unit: z.strictObject({ number: z.int(), slug: z.string(), title: z.string() }),
	/** Null when the unit is open to this person. */
	lock: lockView.nullable(),
	exercise: exerciseProgress,
	client: z.string(),
	receiver: receiverView,
	/** What each question asks for, in order. */
	questions: z.array(z.enum(questionTypes)),
	hints: z.int(),
	/** Receiver time the exercise allows, s of bench clock. */
	benchTimeS: z.number()
});

export type LockView = z.infer<typeof lockView>;
export type RepeatView = z.infer<typeof repeatView>;
export type AttemptLineView = z.infer<typeof attemptLine>;
export type ExerciseProgress = z.infer<typeof exerciseProgress>;
export type UnitProgress = z.infer<typeof unitProgress>;
export type CourseProgress = z.infer<typeof courseProgress>;
export type NextStep = z.infer<typeof nextStep>;
export type LearnHome = z.infer<typeof learnHome>;
export type ExerciseBrief = z.infer<typeof exerciseBrief>;
