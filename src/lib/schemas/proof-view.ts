/** The proof of an exercise as it is kept and shown. */
import { z } from 'zod';
import { questionTypes } from './questions/question';

export const proofRow = z.strictObject({
	question: z.string(),
	/** A mistake's id; null for the taught method. */
	mistake: z.string().nullable(),
	/** What was done, in words. */
	label: z.string(),
	/** Of 0…1. */
	passShare: z.number(),
	/** The share asked: at least of the taught method, at most of a mistake. */
	limit: z.number(),
	/**
	 * Answered − true of each seed in turn, in the question's unit; of what is no number 0 for right and 1 for wrong. Null where
	 * it could not be done.
	 */
	errors: z.array(z.number().nullable()),
	/** One standard deviation of the errors. */
	scatter: z.number(),
	failures: z.array(z.string())
});

export const proofQuestion = z.strictObject({
	id: z.string(),
	/** Of what is no number there is no tolerance: half of what lies between right and wrong stands for it. */
	type: z.enum(questionTypes),
	text: z.string(),
	unit: z.string(),
	digits: z.int(),
	/** Half width of what counts as right with the first seed, in that unit. */
	tolerance: z.number(),
	/** Whether every seed has that tolerance. */
	absolute: z.boolean()
});

/** What to do about a failure, and where it can be done at a press, the tolerance that would do it. */
export const proofAdvice = z.strictObject({
	question: z.string().nullable(),
	says: z.string(),
	tolerance: z.number().nullable()
});

export const proofResult = z.strictObject({
	fromSeed: z.int(),
	seeds: z.int(),
	passed: z.boolean(),
	questions: z.array(proofQuestion),
	rows: z.array(proofRow),
	failures: z.array(z.string()),
	advice: z.array(proofAdvice)
});

/** How the proof of an exercise stands, for the text that is kept now. */
export const proofState = z.strictObject({
	/** Of the text that this is about. */
	hash: z.string(),
	job: z
		.strictObject({
			state: z.enum(['waiting', 'running', 'failed', 'cancelled']),
			done: z.int(),
			total: z.int(),
			problem: z.string().nullable()
		})
		.nullable(),
	result: proofResult.nullable(),
	madeAt: z.iso.datetime().nullable(),
	tookMs: z.int().nullable(),
	/** It stands as it was shipped, proven with the product. */
	shipped: z.boolean()
});

export type ProofRow = z.infer<typeof proofRow>;
export type ProofQuestion = z.infer<typeof proofQuestion>;
export type ProofAdvice = z.infer<typeof proofAdvice>;
export type ProofResult = z.infer<typeof proofResult>;
export type ProofState = z.infer<typeof proofState>;
