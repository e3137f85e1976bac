import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { shortTime } from '../on-and-period';
import { pulsesOf, shownWidthS } from '../pulses';
import { withSettings } from '../spoil';

/** What theory leaves open, as a share of the tolerance: noise on edges that the filter has made slow. */
const OPEN = 0.4;

const lengthened = (context: Context, { resolved }: SetUp): number | null => {
	const train = pulsesOf(context);
	if (!train || resolved.spanHz > 0) return null;
	const shownS = shownWidthS(train.widthS, resolved);
	return shownS - train.widthS > context.question.tolerance / 2 ? shownS : null;
};

/** A pulse timed through a filter that rings longer than the pulse lasts. */
export const narrowForPulse = defineMistake(
	'narrow-for-pulse',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'reading',
		label: `through ${formatFrequency(rbwHz)}`,
		phrase: 'timed the filter in place of the pulse',
		families: ['time', 'pulse'],
		shows: ({ setUp }, context) => lengthened(context, setUp) !== null,
		predict(context, setUp) {
			const shownS = lengthened(context, setUp);
			return shownS === null ? null : { value: shownS, spread: OPEN * context.question.tolerance };
		},
		explain({ setUp, yours, question }) {
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			return {
				title: 'That is how long your filter rings',
				text: `A filter of ${formatFrequency(used)} takes about ${shortTime(0.62 / used)} to come and go, whatever hits it. A shorter pulse comes out that long. Widen the filter until the time no longer changes.`,
				sum: `0.62 / ${formatFrequency(used)} = ${shortTime(0.62 / used)}; you gave ${shortTime(yours)}, the pulse lasts ${shortTime(question.truth)}`,
				part: 'the filter’s own time',
				bad: { at: 'set-up', text: `Here: resolution ${formatFrequency(used)}; wider` }
			};
		},
		make: (steps) => withSettings(steps, { rbwHz, vbwHz: 'auto' })
	})
);
