/** Everything that crosses the wire about an attempt, both ways, but the sweeps themselves (schemas/sweep-stream.ts). */
import { z } from 'zod';
import { readingId, typedAnswer, typedAnswers } from './answer';
import { exerciseView } from './exercise-view';
import { finding } from './finding';
import { markings } from './markings';
import { benchRequest } from './reading';
import { settings, type ResolvedSettings } from './settings';
import { receiverFlag, rowNumber } from './sweep-stream';

export const slug = z
	.string()
	.min(1)
	.max(80)
	.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'small letters, digits and single hyphens');
export const attemptId = z.int().min(1);

/** `POST /api/attempts`: 201 with a fresh attempt, 200 with the one of this exercise that is still open. */
export const startAttemptRequest = z.strictObject({ exercise: slug, practice: z.boolean().default(false) });

/** `PUT /api/attempts/[id]/drafts`: what is typed so far, right or wrong. Replaces the earlier draft. */
export const draftsRequest = z.strictObject({ answers: typedAnswers });
export const draftsResponse = z.strictObject({ savedAt: z.iso.datetime() });

/** `POST /api/attempts/[id]/answers`: hands in and closes. A question left out or left blank is unanswered. */
export const answersRequest = z.strictObject({ answers: typedAnswers });
export const findingResponse = z.strictObject({ finding });

/** `POST /api/attempts/[id]/hints`: the next hint. */
export const hintResponse = z.strictObject({ hint: z.string(), revealed: z.int(), left: z.int() });

/**
 * `POST /api/attempts/[id]/readings`: the server replays these rows and takes the reading itself. A count has neither rows
 * nor trace: the server takes it with the set-up in force, on the bench clock.
 */
export const takeReadingRequest = z
	.strictObject({
		/** The rows the trace holds: the first and the last. A live trace is its last row alone. */
		rows: z
			.strictObject({ from: rowNumber, to: rowNumber })
			.refine((rows) => rows.to >= rows.from, { message: 'to must not be less than from', path: ['to'] })
			.optional(),
		/** Which trace, 1…4, of the set-up that swept the last row. */
		trace: z.int().min(1).max(4).optional(),
		request: benchRequest
	})
	.superRefine(({ request, ...taken }, context) => {
		const counts = request.kind === 'count';
		for (const field of ['rows', 'trace'] as const) {
			if (counts !== (taken[field] !== undefined)) continue;
			const message = counts ? 'a count is taken off no trace: leave this out' : 'say what it is read from';
			context.addIssue({ code: 'custom', path: [field], message });
		}
	});

export const remarkView = z.strictObject({ code: z.string(), text: z.string() });
/** A reading as the server took it. */
export const readingView = z.strictObject({
	id: readingId,
	/** A count has a row number of its own, which no sweep has. */
	rows: z.strictObject({ from: rowNumber, to: rowNumber }),
	/** Null for a count. */
	trace: z.int().nullable(),
	/** What the trace was: "average of 16" is mode average, count 16. Null for a count. */
	mode: z.string().nullable(),
	count: z.int(),
	request: benchRequest,
	kind: z.string(),
	value: z.number(),
	unit: z.string(),
	/** One standard deviation from the set-up, in the reading's unit (dB for levels). */
	spread: z.number(),
	remarks: z.array(remarkView),
	parts: z.unknown().optional(),
	/** Number of the set-up in the log, from 0. */
	setUp: z.int(),
	takenAt: z.iso.datetime()
});
export const readingResponse = z.strictObject({ reading: readingView });

export const draftsView = z.strictObject({
	answers: z.record(z.string(), typedAnswer),
	savedAt: z.iso.datetime().nullable()
});

/** Where the bench stands. To show it again: fetch rows restartRow…drawnTo, then ask for sweeps from resumeFrom. */
export const benchView = z.strictObject({
	/** As typed; the exercise's start settings until the first sweep. */
	settings,
	resolved: z.custom<ResolvedSettings>((value) => typeof value === 'object' && value !== null),
	/** Number of the set-up in the log, null before the first sweep. */
	setUp: z.int().nullable(),
	nextRow: rowNumber,
	/** Last row known to be drawn since the restart; null when none is. */
	drawnTo: rowNumber.nullable(),
	/** What to give as `from` to go on here. */
	resumeFrom: rowNumber,
	/** Where holds and averages of this set-up start. */
	restartRow: rowNumber,
	clockS: z.number(),
	benchTimeUsedS: z.number(),
	flags: z.array(receiverFlag),
	/** The input protection has tripped and waits for a pad, attenuation and a reset. */
	protectionTripped: z.boolean()
});

export const attemptView = z.strictObject({
	id: attemptId,
	/** The first, second … attempt of this person at this exercise. */
	number: z.int(),
	/** It takes no try and never counts. */
	practice: z.boolean(),
	triesLeft: z.int(),
	state: z.enum(['open', 'closed']),
	startedAt: z.iso.datetime(),
	closedAt: z.iso.datetime().nullable(),
	exercise: exerciseView,
	bench: benchView,
	readings: z.array(readingView),
	drafts: draftsView,
	/** Null before anything was marked. */
	markings: markings.nullable(),
	hints: z.strictObject({ count: z.int(), revealed: z.array(z.string()) })
});
export const attemptResponse = z.strictObject({ attempt: attemptView });

/** Every refusal: which field, and why. */
export const problemResponse = z.object({
	message: z.string(),
	issues: z.array(z.object({ field: z.string(), message: z.string() })).optional()
});

export type StartAttemptRequest = z.infer<typeof startAttemptRequest>;
export type DraftsRequest = z.infer<typeof draftsRequest>;
export type DraftsResponse = z.infer<typeof draftsResponse>;
export type AnswersRequest = z.infer<typeof answersRequest>;
export type FindingResponse = z.infer<typeof findingResponse>;
export type HintResponse = z.infer<typeof hintResponse>;
export type TakeReadingRequest = z.infer<typeof takeReadingRequest>;
export type ReadingView = z.infer<typeof readingView>;
export type ReadingResponse = z.infer<typeof readingResponse>;
export type DraftsView = z.infer<typeof draftsView>;
export type BenchView = z.infer<typeof benchView>;
export type AttemptView = z.infer<typeof attemptView>;
export type AttemptResponse = z.infer<typeof attemptResponse>;
export type ProblemResponse = z.infer<typeof problemResponse>;
