/** Names and texts that authors write. */
import { z } from 'zod';
import { expression } from '../template';

export const slug = z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'lower-case words joined by hyphens');
/** Names of values: letters and digits, a letter first; units in the name (leadLossDb). */
export const valueName = z
	.string()
	.regex(/^[a-zA-Z][a-zA-Z0-9]{0,39}$/, 'letters and digits, a letter first');
export const text = z.string().trim().min(1).max(4000);
export const line = z.string().trim().min(1).max(300);

const choiceValue = z.union([z.number(), z.string()]);
/** Present, or true, only when each named parameter has (one of) the given value(s). */
export const when = z.record(valueName, z.union([choiceValue, z.array(choiceValue).min(1)]));
export type When = z.infer<typeof when>;

/** Whether something holds on a draw: stated, when parameters have given values, or an expression that gives 0 for no. */
export const truthful = z.union([z.boolean(), when, expression], {
	error: 'give true, false, values of parameters, or an expression that starts with "="'
});
export type Truthful = z.infer<typeof truthful>;

/** What is said of a mistake that an author foresees: "A product of your own mixer", and why in the learner's terms. */
export const foreseen = z.strictObject({ title: line, text: z.string().trim().min(1).max(1000) });
export type Foreseen = z.infer<typeof foreseen>;
