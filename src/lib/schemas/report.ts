/** The measurement report of a closed attempt: what was set, seen, read and answered, on one page. */
import { z } from 'zod';
import { readingView } from './attempt';
import { readingMark } from './done-right';
import { exerciseView } from './exercise-view';
import { measured, verdicts } from './questions/finding';
import { resolvedSettings, traceModes } from './settings';
import { rowNumber } from './sweep-stream';

export const reportPicture = z.strictObject({
	/** The last row of its traces. */
	row: rowNumber,
	traces: z.array(
		z.strictObject({
			mode: z.enum(traceModes),
			count: z.int(),
			/** dBm; empty for a trace that can't be made again. */
			levelsDbm: z.array(z.number())
		})
	),
	/** Readings that answers rest on, taken with this set-up. */
	marks: z.array(
		z.strictObject({
			readingId: z.int(),
			trace: z.int(),
			mark: readingMark,
			value: z.number(),
			unit: z.string()
		})
	)
});

export const reportView = z.strictObject({
	attemptId: z.int(),
	number: z.int(),
	/** Whose measurement it is. */
	person: z.string(),
	startedAt: z.iso.datetime(),
	closedAt: z.iso.datetime(),
	benchTimeUsedS: z.number(),
	exercise: exerciseView,
	/** The set-up that the first answer's reading was taken with, else the last that swept; null when nothing was swept. */
	setUp: resolvedSettings.nullable(),
	picture: reportPicture.nullable(),
	/** In the order taken. */
	readings: z.array(readingView),
	answers: z.array(
		z.strictObject({
			id: z.string(),
			text: z.string(),
			/** A number; null when it is none, or none was given. */
			yours: measured.nullable(),
			/** What was answered, in words. */
			answer: z.string().nullable(),
			verdict: z.enum(verdicts),
			toleranceText: z.string(),
			readingId: z.int().nullable()
		})
	),
	passed: z.boolean()
});

export type ReportPicture = z.infer<typeof reportPicture>;
export type ReportView = z.infer<typeof reportView>;
