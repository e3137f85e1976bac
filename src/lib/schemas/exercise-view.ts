/** What a learner is shown of an exercise: nothing here may hold a scene, a seed, a truth or a mistake watched for. */
import { z } from 'zod';
import { chainPart } from './exercise';
import { questionView } from './questions/view';
import { maskLimits } from './reading';
import { lossTable } from './scene';
import { settings } from './settings';

/** What the receiver's data sheet says and the bench page needs to offer only what it has. */
export const receiverView = z.strictObject({
	name: z.string(),
	startHz: z.number(),
	stopHz: z.number(),
	rbwHz: z.array(z.number()),
	attenuatorDb: z.array(z.number()),
	/** Gain of the preamplifier, dB; null when the receiver has none. */
	preampGainDb: z.number().nullable(),
	maxSafeInputDbm: z.number(),
	levelErrorDb: z.number(),
	referencePpm: z.number()
});

export const exerciseView = z.strictObject({
	slug: z.string(),
	title: z.string(),
	/** Where it stands: "Unit 6, Power of a spread signal". */
	course: z.strictObject({ slug: z.string(), title: z.string() }),
	unit: z.strictObject({ slug: z.string(), title: z.string(), number: z.int() }),
	/** Position in its unit, from 1: exercise 6.2 is unit 6, number 2. */
	number: z.int(),
	client: z.string(),
	/** Sanitised on the server when the course was imported. */
	situationHtml: z.string(),
	/** The reference plane the answers are for, in words. */
	plane: z.string(),
	chain: z.array(chainPart),
	/** Loss of each lead or pad in the chain, as the learner is told it. */
	leads: z.array(z.strictObject({ label: z.string(), loss: lossTable })),
	cautions: z.array(z.string()),
	/** Limits that the order sets, as levels on the screen. */
	mask: z.strictObject({ limits: maskLimits }).optional(),
	receiver: receiverView,
	start: settings,
	questions: z.array(questionView),
	/** Receiver time the exercise allows, s of bench clock. */
	benchTimeS: z.number(),
	/** Attempts allowed. */
	tries: z.int()
});

export type ReceiverView = z.infer<typeof receiverView>;
export type ExerciseView = z.infer<typeof exerciseView>;
