/**
 * What the grader says of one attempt, as it crosses the wire after the attempt has closed.
 * Levels and frequencies are plain numbers with their unit beside them; the page formats them.
 */
import { z } from 'zod';
import { measured, questionFinding } from './questions/finding';

/** One line of what was done. `at` is the wall time handed in with the log; `bad` says what was wrong with the step. */
export const findingLogStep = z.strictObject({
	at: z.string().optional(),
	clockS: z.number(),
	text: z.string(),
	bad: z.string().optional()
});

/** One step of the taught method, run on the learner's own seed. */
export const doneRightStep = z.strictObject({
	text: z.string(),
	value: measured.optional(),
	/** What was answered, in words, where that is no number. */
	answer: z.string().optional(),
	why: z.string().optional()
});

export const finding = z.strictObject({
	questions: z.array(questionFinding),
	log: z.array(findingLogStep),
	doneRight: z.array(doneRightStep),
	/** True when every question's verdict is right or right-but-method. */
	passed: z.boolean()
});

export type FindingLogStep = z.infer<typeof findingLogStep>;
export type DoneRightStep = z.infer<typeof doneRightStep>;
export type Finding = z.infer<typeof finding>;
