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

export const markView = z.strictObject({
	type: z.literal('mark'),
	...common,
	shape: z.enum(['flag', 'band'])
});
export const orderView = z.strictObject({
	type: z.literal('order'),
	...common,
	items: z.array(z.strictObject({ key: optionKey, text: z.string() }))
});
export const emissionsView = z.strictObject({
	type: z.literal('emissions'),
	...common,
	/** Whether each row says if its limit is broken. */
	asksBreaks: z.boolean()
});
export const uncertaintyView = z.strictObject({
	type: z.literal('uncertainty'),
	...common,
	unit: z.enum(answerUnits),
	units: z.array(z.string())
});

export const questionView = z.discriminatedUnion('type', [
	numberView,
	choiceView,
	setUpView,
	markView,
	orderView,
	emissionsView,
	uncertaintyView
]);
export type QuestionView = z.infer<typeof questionView>;
export type QuestionViewAs<T extends QuestionView['type']> = Extract<QuestionView, { type: T }>;
