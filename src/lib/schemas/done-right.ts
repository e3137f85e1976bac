/**
 * `GET /api/attempts/[id]/done-right`: the taught method on the learner's own seed, step by step, once the attempt is closed.
 * The rows on show after a step come as frames from `…/done-right/rows?step=`; they are numbered on their own, from 0.
 */
import { z } from 'zod';
import { doneRightStep } from './finding';
import { digits } from './number';
import { resolvedSettings } from './settings';
import { rowNumber } from './sweep-stream';

/** Where a reading stands on the plot. */
export const readingMark = z.union([
	z.strictObject({ startHz: z.number(), stopHz: z.number() }),
	z.strictObject({ frequencyHz: z.number() })
]);

export const playedStep = doneRightStep.extend({
	do: z.enum(['set', 'sweep', 'read', 'answer']),
	/** The receiver after this step. */
	resolved: resolvedSettings,
	/** The rows that its traces hold after this step: the first since they restarted, and the last; null before the first. */
	rows: z.strictObject({ from: rowNumber, to: rowNumber }).nullable(),
	reading: z
		.strictObject({
			/** Of the set-up, 1 … 4. */
			trace: z.int(),
			spread: z.number(),
			remarks: z.array(z.strictObject({ code: z.string(), text: z.string() })),
			mark: readingMark.nullable()
		})
		.optional()
});
export const doneRightResponse = z.strictObject({
	/** The receiver before the first step. */
	start: resolvedSettings,
	steps: z.array(playedStep)
});

/**
 * Which step's rows are asked for, from 0: those its traces hold; where nothing has been swept yet with its set-up, the one
 * sweep that would come next.
 */
export const stepQuery = z.strictObject({ step: digits.pipe(z.int().min(0).max(59)) });

export type ReadingMark = z.infer<typeof readingMark>;
export type PlayedStepView = z.infer<typeof playedStep>;
export type DoneRightResponse = z.infer<typeof doneRightResponse>;
