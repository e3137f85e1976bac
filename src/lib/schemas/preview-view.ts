/** What a draft's file looks like before it is published. */
import { z } from 'zod';
import { figureChoice } from './figure';
import { figureState } from './figure-view';
import { lessonPartView } from './lesson-view';
import { readingRequest } from './reading';

/** A fault by field, with its line where the text has one. */
export const textFault = z.strictObject({
	field: z.string(),
	message: z.string(),
	line: z.int().nullable()
});

/** One seed's signal as the taught method first sweeps it, and what is true of it. For authors only. */
export const signalPreview = z.strictObject({
	seed: z.int(),
	title: z.string(),
	/** Draws turned down because two mistakes lay too near to each other. */
	redraws: z.int(),
	/** What the draw gave, by name. */
	drawn: z.array(z.strictObject({ name: z.string(), value: z.string(), shown: z.boolean() })),
	situation: z.string(),
	truths: z.array(
		z.strictObject({
			question: z.string(),
			text: z.string(),
			/** With its unit, as it is shown. */
			value: z.number(),
			unit: z.string(),
			digits: z.int(),
			tolerance: z.number()
		})
	),
	requests: z.array(readingRequest),
	state: figureState
});

export const exercisePreview = z.strictObject({
	faults: z.array(textFault),
	/** Null when there are faults, or no such signal can be drawn or swept. */
	signal: signalPreview.nullable()
});
export const lessonPreview = z.strictObject({
	faults: z.array(textFault),
	title: z.string(),
	words: z.int(),
	parts: z.array(lessonPartView),
	/** Links that lead nowhere on this site, and those that the lesson doesn't keep. */
	links: z.array(z.strictObject({ href: z.string(), problem: z.string().nullable() }))
});

const text = z.string().max(120_000);
export const lessonPreviewRequest = z.strictObject({ text });
export const figureTurnRequest = z.strictObject({
	text,
	id: z.string().max(80),
	values: z.array(figureChoice).max(3)
});
export const exercisePreviewRequest = z.strictObject({
	text,
	/** Of the file, in its unit's folder: its slug must be the same. */
	path: z.string().max(200),
	seed: z.int().min(0).max(1_000_000)
});

export type TextFault = z.infer<typeof textFault>;
export type SignalPreview = z.infer<typeof signalPreview>;
export type ExercisePreview = z.infer<typeof exercisePreview>;
export type LessonPreview = z.infer<typeof lessonPreview>;
