/** What the home pages of those who teach and run the place say. */
import { z } from 'zod';

const figures = z.strictObject({
	slug: z.string(),
	title: z.string(),
	/** "6.1" */
	place: z.string(),
	people: z.int(),
	closed: z.int(),
	passed: z.int(),
	open: z.int()
});

const benchLine = z.strictObject({
	attemptId: z.int(),
	/** Null where it isn't for this person to know. */
	name: z.string().nullable(),
	exerciseTitle: z.string(),
	number: z.int(),
	at: z.iso.datetime(),
	passed: z.boolean().nullable()
});

const courseLine = z.strictObject({
	title: z.string(),
	edition: z.int(),
	publishedAt: z.iso.datetime(),
	units: z.int(),
	exercises: z.int()
});

const personLine = z.strictObject({
	id: z.int(),
	name: z.string(),
	email: z.string(),
	roles: z.array(z.string()),
	disabled: z.boolean(),
	lastSignInAt: z.iso.datetime().nullable(),
	attempts: z.int(),
	passed: z.int()
});

export const teachOverview = z.strictObject({
	exercises: z.array(figures),
	atBench: z.array(benchLine),
	latest: z.array(benchLine)
});

export const peopleOverview = z.strictObject({
	people: z.array(personLine),
	courses: z.array(courseLine)
});

export const serverState = z.strictObject({
	node: z.string(),
	database: z.string(),
	startedAt: z.iso.datetime(),
	streams: z.int(),
	sessions: z.int()
});

export type ExerciseFigures = z.infer<typeof figures>;
export type BenchLine = z.infer<typeof benchLine>;
export type CourseLine = z.infer<typeof courseLine>;
export type PersonLine = z.infer<typeof personLine>;
export type TeachOverview = z.infer<typeof teachOverview>;
export type PeopleOverview = z.infer<typeof peopleOverview>;
export type ServerState = z.infer<typeof serverState>;
