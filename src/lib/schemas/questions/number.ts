/** A number with its unit, at the reference plane. */
import { z } from 'zod';
import { asked } from './asked';
import { units } from '$lib/units/unit';
import { part } from '../part';
import { quantity } from '../quantity';
import { templateOf } from '../template';
import { slug } from './words';

/** Units that answers are kept in; what people may type instead follows from the unit's dimension. */
export const answerUnits = units;

/** A mistake watched on a question: its kind, and the parameters that the kind asks for (checked by the bench by name). */
const watchedMistake = z.looseObject({ kind: slug });

/** Half width of what counts as right: in the question's unit, or as a share of the true value. */
export const tolerance = z.union(
	[
		z.strictObject({ absolute: z.number().positive() }),
		z.strictObject({ relative: z.number().positive().max(1) })
	],
	{ error: 'give either absolute or relative, greater than 0' }
);

export const numberQuestion = z.strictObject({
	type: z.literal('number'),
	...asked,
	quantity: templateOf(quantity),
	/** Asks for a part of the quantity in place of its value: the distance of a delta, one neighbour of several. */
	part: templateOf(part).optional(),
	/**
	 * Asks for a level or density without the noise it stands in: the receiver's own, and beside a line the scene's too.
	 * An answer may then be a reading with that noise taken off as power.
	 */
	noiseTakenOff: z.boolean().default(false),
	unit: z.enum(answerUnits),
	tolerance,
	/** Decimals, in that unit. */
	digits: z.int().min(0).max(9),
	mistakes: z.array(watchedMistake).min(1).max(20)
});

export type AnswerUnit = (typeof answerUnits)[number];
export type Tolerance = z.infer<typeof tolerance>;
export type WatchedMistake = z.infer<typeof watchedMistake>;
export type WrittenNumber = z.infer<typeof numberQuestion>;
