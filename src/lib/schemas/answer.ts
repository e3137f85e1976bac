/** An answer as it crosses the wire: as typed, chosen or pointed at, one shape for each type of question. */
import { z } from 'zod';
import { frequency } from './number';
import { withType } from './questions/question';

export const readingId = z.int().min(1);
/** Names an option as it is offered: a letter, which tells nothing of the order in which it was written. */
export const optionKey = z.string().regex(/^[a-z]$/, 'a letter');

/** A number as the person typed it, in which unit, resting on which reading. */
export const typedNumber = z.strictObject({
	type: z.literal('number'),
	text: z.string().max(60),
	unit: z.string().min(1).max(16),
	readingId: readingId.nullish()
});
/** The options chosen; none is no answer. */
export const typedChoice = z.strictObject({ type: z.literal('choice'), chosen: z.array(optionKey).max(26) });
/** The set-up handed in, by its number in the log; null is no answer. */
export const typedSetUp = z.strictObject({
	type: z.literal('set-up'),
	setUp: z.int().min(0).max(1_000_000).nullable()
});

/** Places on the frequency axis, Hz: of a flag the first alone; null where none is marked yet. */
export const typedMark = z.strictObject({
	type: z.literal('mark'),
	atHz: frequency.nullable(),
	toHz: frequency.nullish()
});
/** The items in their order; none is no answer. */
export const typedOrder = z.strictObject({ type: z.literal('order'), order: z.array(optionKey).max(26) });
const typedFigure = z.strictObject({ text: z.string().max(60), unit: z.string().min(1).max(16) });
/** Rows of a table; a row with neither frequency nor level is none. */
export const typedEmissions = z.strictObject({
	type: z.literal('emissions'),
	rows: z
		.array(z.strictObject({ frequency: typedFigure, level: typedFigure, breaks: z.boolean().nullable() }))
		.max(24)
});
/** A value, its expanded uncertainty in dB and the coverage factor, as typed. */
export const typedUncertainty = z.strictObject({
	type: z.literal('uncertainty'),
	value: typedFigure,
	expanded: z.string().max(60),
	k: z.string().max(60),
	readingId: readingId.nullish()
});

const union = z.discriminatedUnion('type', [
	typedNumber,
	typedChoice,
	typedSetUp,
	typedMark,
	typedOrder,
	typedEmissions,
	typedUncertainty
]);
/** One that names no type is a number. */
export const typedAnswer = z.preprocess(withType, union);
export const typedAnswers = z
	.record(z.string().min(1).max(60), typedAnswer)
	.refine((answers) => Object.keys(answers).length <= 50, { message: 'no exercise asks so many questions' });

export type TypedAnswer = z.infer<typeof union>;
export type TypedAnswers = Record<string, TypedAnswer>;
export type TypedAs<T extends TypedAnswer['type']> = Extract<TypedAnswer, { type: T }>;
