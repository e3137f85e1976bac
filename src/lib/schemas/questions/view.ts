/** What a learner is shown of a question: nothing here may tell what is right. */
import { z } from 'zod';
import { optionKey } from '../answer';
import { answerUnits } from './number';

const common = {
	id: z.string(),
	text: z.string(),
	/** What counts as right, in words: "Right within ±0.7 dB", "One is right". */
	toleranceText: z.string()
};

export const numberView = z.strictObject({
	type: z.literal('number'),
	...common,
	/** The unit asked for, and every unit the answer may be given in (that one first). */
	unit: z.enum(answerUnits),
	units: z.array(z.string()),
	/** Decimals the answer is asked to. */
	digits: z.int()
});
export const choiceView = z.strictObject({
	type: z.literal('choice'),
	...common,
	pick: z.enum(['one', 'several']),
	options: z.array(z.strictObject({ key: optionKey, text: z.string() }))
});
export const setUpView = z.strictObject({ type: z.literal('set-up'), ...common });

export const questionView = z.discriminatedUnion('type', [numberView, choiceView, setUpView]);
export type QuestionView = z.infer<typeof questionView>;
export type QuestionViewAs<T extends QuestionView['type']> = Extract<QuestionView, { type: T }>;
