import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import type { Source } from '../evidence';
import { harmonicsOf } from '../harmonic-parts';
import { defineMistake, type Context } from '../mistake';
import { readStepOf, withReading } from '../spoil';

const ORDINALS = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh'];
/** How far a receiver's error at one harmonic differs from that at another, dB. */
const UNEVEN_DB = 0.2;
const ordinal = (n: number): string => ORDINALS[n - 1] ?? `${n}th`;

const askedN = ({ question: { part } }: Context): number =>
	part !== undefined && typeof part !== 'string' && 'n' in part ? part.n : 2;

/** The right reading, the wrong row of it: another harmonic than the one asked for. */
export const otherHarmonic = defineMistake(
	'other-harmonic',
	z.strictObject({ n: z.int().min(2).max(21) }),
	({ n }) => {
		const change = (context: Context, source?: Source): number | null => {
			const all = harmonicsOf(context, source);
			const [other, asked] = [n, askedN(context)].map((one) => all.find((harmonic) => harmonic.n === one));
			return other && asked ? other.dbc - asked.dbc : null;
		};
		return {
			stage: 'slip',
			label: `${ordinal(n)} harmonic`,
			phrase: `gave the ${ordinal(n)} harmonic`,
			change: (context, _, source) => change(context, source),
			// a receiver's level is not wrong by the same at two frequencies
			spread: () => UNEVEN_DB,
			explain({ yours, ...context }) {
				const { digits, unit, truth } = context.question;
				const asked = askedN(context);
				return {
					title: `That is the ${ordinal(n)}`,
					text: `The reading lists every harmonic, and the order asks for the ${ordinal(asked)}: the one at ${asked} times the carrier’s frequency. The strongest need not be it.`,
					sum: `${ordinal(n)} ${figure(yours, digits)} ${unit}, ${ordinal(asked)} ${figure(truth, digits)} ${unit}`,
					part: `the ${ordinal(n)} harmonic, not the ${ordinal(asked)}`,
					bad: {
						at: 'answer',
						text: `Here: the ${ordinal(n)} harmonic; the order says the ${ordinal(asked)}`
					}
				};
			},
			make: (steps, { question }) =>
				withReading(steps, question.id, readStepOf(steps, question.id).reading, undefined, { n })
		};
	}
);
