import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context } from '../mistake';
import { toneOf } from '../modulation';
import { said } from '../said';
import { withSum } from '../spoil';

/** First and second zero of J₀ (Abramowitz & Stegun, table 9.5). */
const NULLS = [2.4048, 5.5201];

/** The null that the carrier stands in, and the one it was taken for. */
function nullsOf(context: Context): { own: number; other: number; isFirst: boolean } {
	const isFirst = toneOf(context).index < (NULLS[0] + NULLS[1]) / 2;
	return { own: NULLS[isFirst ? 0 : 1], other: NULLS[isFirst ? 1 : 0], isFirst };
}

/** A carrier that has vanished taken to stand in the other of its first two nulls. */
export const otherNull = defineMistake('other-null', z.strictObject({}), () => {
	const given = (value: number, context: Context): number => {
		const { own, other } = nullsOf(context);
		return (value * other) / own;
	};
	return {
		stage: 'slip',
		label: 'the other null',
		phrase: 'counted the wrong null of the carrier',
		change: (context) => given(context.question.truth, context) - context.question.truth,
		given,
		explain({ yours, ...context }) {
			const { question } = context;
			const { own, other, isFirst } = nullsOf(context);
			const { modulatingHz } = toneOf(context);
			const tone = said(modulatingHz, question);
			return {
				title: 'The carrier vanishes more than once',
				text: `It does so where J₀ is zero: at an index of ${figure(NULLS[0], 3)}, again at ${figure(NULLS[1], 3)}, and on. Here it is the ${isFirst ? 'first' : 'second'} time, and you took it for the ${isFirst ? 'second' : 'first'}. The sidebands tell them apart: ${isFirst ? 'the first pair is the strongest, and the fourth hardly shows' : 'the strongest lie far out, at the fourth pair, and the first pair is weaker'}.`,
				sum: `${figure(own, 3)} × ${tone} = ${said(own * modulatingHz, question)}; ${figure(other, 3)} × ${tone} = ${said(yours, question)}`,
				part: `the ${isFirst ? 'second' : 'first'} null, not the ${isFirst ? 'first' : 'second'}`,
				bad: { at: 'answer', text: 'Here: the index of the other null; count the sidebands' }
			};
		},
		make: (steps, context) => withSum(steps, context.question.id, (value) => given(value, context))
	};
});
