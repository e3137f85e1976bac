/** What the grader says of one question, as it crosses the wire after the attempt has closed: one shape for each type. */
import { z } from 'zod';
import { scales, traceModes } from '../settings';
import { answerUnits } from './number';

const unit = z.enum(answerUnits);
export const measured = z.strictObject({ value: z.number(), unit, digits: z.int() });

export const verdicts = ['right', 'right-but-method', 'wrong', 'unanswered'] as const;

/** One mistake found (or, for `right-but-method`, one fault of the method): words and the sum in the learner's own numbers. */
export const findingMistake = z.strictObject({
	kind: z.string(),
	/** "A point is not a power" */
	title: z.string(),
	text: z.string(),
	/** "10 log (16 000/1 064.5) = 11.8 dB"; set in figures. */
	sum: z.string().optional(),
	/** Small print beside the sum: "less 1.1 dB of statistical scatter and receiver error". */
	note: z.string().optional()
});

/** Steps from the learner's number up (or down) to the true one, in the question's unit. */
export const findingLadder = z.strictObject({
	unit,
	yours: z.number(),
	true: z.number(),
	/** In order from yours; their `change`s add up to true − yours. */
	parts: z.array(z.strictObject({ from: z.number(), to: z.number(), change: z.number(), text: z.string() })),
	/** Named levels worth a dotted line: "channel power at the receiver". */
	levels: z.array(z.strictObject({ value: z.number(), text: z.string() }))
});

/** What each watched mistake would have given on this signal. */
export const findingNumberLine = z.strictObject({
	unit,
	marks: z.array(
		z.strictObject({
			value: z.number(),
			label: z.string(),
			role: z.enum(['yours', 'true', 'mistake']),
			/** The mistake that was matched. */
			matched: z.boolean()
		})
	)
});

/** What the plot draws for a question: the band asked for at its true level, and the point that was read. */
export const findingPlot = z.strictObject({
	band: z
		.strictObject({ startHz: z.number(), stopHz: z.number(), value: z.number(), unit, text: z.string() })
		.nullable(),
	/** The true frequency that was asked for. */
	at: z.strictObject({ frequencyHz: z.number(), text: z.string() }).nullish(),
	point: z.strictObject({ frequencyHz: z.number(), levelDbm: z.number() }).nullable(),
	/** The sweep to draw, that of the attached reading, else the last one: its rows, its trace (1…4), how they combine. */
	trace: z
		.strictObject({
			fromRow: z.int(),
			toRow: z.int(),
			trace: z.int(),
			mode: z.enum(traceModes),
			count: z.int(),
			scale: z.enum(scales)
		})
		.nullable(),
	/** The signal itself at the reference plane, through the resolution bandwidth of that sweep, noise-free. */
	signal: z
		.strictObject({
			startHz: z.number(),
			stopHz: z.number(),
			rbwHz: z.number(),
			levelsDbm: z.array(z.number())
		})
		.nullable()
});

const common = {
	id: z.string(),
	text: z.string(),
	verdict: z.enum(verdicts),
	/** One sentence: "You read one point of the hump, and left the lead out." */
	title: z.string(),
	/** What was answered, in words; null when nothing was. */
	answer: z.string().nullable(),
	mistakes: z.array(findingMistake),
	remarks: z.array(z.strictObject({ code: z.string(), text: z.string() })),
	plot: findingPlot
};

export const numberFinding = z.strictObject({
	type: z.literal('number'),
	...common,
	yours: measured.nullable(),
	true: measured,
	/** yours − true, in the question's unit; null when unanswered. */
	difference: z.number().nullable(),
	/** Half width of what counts as right, in the question's unit. */
	tolerance: z.number(),
	ladder: findingLadder.nullable(),
	numberLine: findingNumberLine
});

export const choiceFinding = z.strictObject({
	type: z.literal('choice'),
	...common,
	pick: z.enum(['one', 'several']),
	options: z.array(z.strictObject({ text: z.string(), chosen: z.boolean(), right: z.boolean() }))
});

export const setUpFinding = z.strictObject({
	type: z.literal('set-up'),
	...common,
	/** What was asked of the set-up, and what it was; none when none was handed in. */
	conditions: z.array(z.strictObject({ asked: z.string(), found: z.string(), met: z.boolean() }))
});

/** Hz; of a flag the first alone. */
const places = z.strictObject({ atHz: z.number(), toHz: z.number().optional() });
export const markFinding = z.strictObject({
	type: z.literal('mark'),
	...common,
	yours: places.nullable(),
	true: places,
	toleranceHz: z.number()
});

export const orderFinding = z.strictObject({
	type: z.literal('order'),
	...common,
	/** Texts of the items, first to last. */
	yours: z.array(z.string()).nullable(),
	true: z.array(z.string())
});

const emission = z.strictObject({ atHz: z.number(), levelDbm: z.number(), breaks: z.boolean().nullable() });
export const emissionsFinding = z.strictObject({
	type: z.literal('emissions'),
	...common,
	/** True ones in order of frequency, each beside the row that meant it; then rows that are none of them. */
	rows: z.array(
		z.strictObject({
			name: z.string().nullable(),
			yours: emission.nullable(),
			true: emission.nullable(),
			/** What is wrong with it, in a few words. */
			fault: z.string().nullable()
		})
	),
	asksBreaks: z.boolean()
});

export const uncertaintyFinding = z.strictObject({
	type: z.literal('uncertainty'),
	...common,
	yours: z.strictObject({ value: measured, expandedDb: z.number(), k: z.number() }).nullable(),
	true: measured,
	toleranceDb: z.number(),
	/** ± as it is known, and the standard uncertainty it stands for, dB. */
	budget: z.array(z.strictObject({ text: z.string(), db: z.number(), standardDb: z.number() })),
	/** Combined standard uncertainty, and expanded with the coverage factor stated, or 2; dB. */
	combinedDb: z.number(),
	expandedDb: z.number()
});

export const questionFinding = z.discriminatedUnion('type', [
	numberFinding,
	choiceFinding,
	setUpFinding,
	markFinding,
	orderFinding,
	emissionsFinding,
	uncertaintyFinding
]);

export type Verdict = (typeof verdicts)[number];
export type Measured = z.infer<typeof measured>;
export type FindingMistake = z.infer<typeof findingMistake>;
export type FindingLadder = z.infer<typeof findingLadder>;
export type FindingNumberLine = z.infer<typeof findingNumberLine>;
export type FindingPlot = z.infer<typeof findingPlot>;
export type NumberFinding = z.infer<typeof numberFinding>;
export type QuestionFinding = z.infer<typeof questionFinding>;
export type FindingAs<T extends QuestionFinding['type']> = Extract<QuestionFinding, { type: T }>;
