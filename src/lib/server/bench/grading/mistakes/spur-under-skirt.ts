import { filterLossDb } from '$lib/measure/resolution-filter';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { pointSpreadDb } from '../noise-law';
import { lineDbm } from '../other-carrier';
import { said } from '../said';
import { shownReading } from '../shown-reading';
import { modelSpread } from '../spreads';
import { withSettings } from '../spoil';

/** How far under the line the filter's flank counts for nothing, dB. */
const CLEAR_DB = 10;

/** By how much the noise within the filter lifts the line asked for, dB; null where the set-up shows none. */
function liftDb(context: Context, setUp: SetUp): number | null {
	const shown = shownReading(context, setUp, askedReading(context));
	return shown === null ? null : shown - context.question.truth;
}
/** Whether the filter's own flank, down from the carrier, stands over the line: that is another mistake. */
function isOnFlank(context: Context, { resolved: { rbwHz } }: SetUp): boolean {
	const { quantity } = context.question;
	if (quantity.kind !== 'delta') return false;
	const { fromHz, toHz } = quantity;
	const flankDbm = lineDbm(context, fromHz) - filterLossDb(toHz - fromHz, rbwHz);
	return flankDbm > lineDbm(context, toHz) - CLEAR_DB;
}

const covers = (context: Context, setUp: SetUp): boolean =>
	!isOnFlank(context, setUp) && (liftDb(context, setUp) ?? 0) > context.question.tolerance / 2;

/** A weak line read through a filter that lets in more of the skirt's noise than of the line. */
export const spurUnderSkirt = defineMistake(
	'spur-under-skirt',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'reading',
		label: `skirt in ${formatFrequency(rbwHz)}`,
		phrase: 'read the skirt’s noise for the line inside it',
		families: ['delta'],
		shows: ({ setUp }, context) => covers(context, setUp),
		predict(context, setUp) {
			const lift = liftDb(context, setUp);
			if (lift === null || !covers(context, setUp)) return null;
			// of what is shown, the noise strays by itself and beats with the line
			const noisy = pointSpreadDb(setUp) * (1 - 10 ** (-lift / 10));
			return {
				value: context.question.truth + lift,
				spread: Math.hypot(2 * modelSpread(context.question), 1.5 * noisy)
			};
		},
		explain({ setUp, yours, question }) {
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			return {
				title: 'A skirt fills a wide filter',
				text: `The noise around a carrier is a density: a filter of ${formatFrequency(used)} takes in all of it that fits, and the line stands in that as deep as in a hedge. Each step from 3 to 1 takes the noise down by 5 dB and leaves the line where it is. Go on until the line no longer changes.`,
				sum: `${said(yours, question)} with the skirt’s noise, ${said(question.truth, question)} the line alone`,
				part: 'noise of the skirt within the filter',
				bad: { at: 'set-up', text: `Here: resolution ${formatFrequency(used)}; narrower` }
			};
		},
		make: (steps) => withSettings(steps, { rbwHz, vbwHz: 'auto', sweepTimeS: 'auto' })
	})
);
