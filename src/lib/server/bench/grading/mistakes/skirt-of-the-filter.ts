import { filterLossDb } from '$lib/measure/resolution-filter';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { SetUp } from '../mistake';
import { figure } from '$lib/server/bench/exercise/figure';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context } from '../mistake';
import { shownReading } from '../shown-reading';
import { modelSpread } from '../spreads';
import { withoutSum, withSettings } from '../spoil';

const offsetHzOf = ({ question: { quantity } }: Context): number =>
	quantity.kind === 'phase-noise' ? Math.abs(quantity.offsetHz) : Infinity;

/** Whether the filter shows the carrier itself above the noise at the offset, 1 Hz of either. */
const showsCarrier = (context: Context, { resolved: { rbwHz } }: SetUp): boolean =>
	-filterLossDb(offsetHzOf(context), rbwHz) - 10 * Math.log10(rbwHz) > context.question.truth - 3;

/** Phase noise read so near a carrier that the resolution filter still shows the carrier. */
export const skirtOfTheFilter = defineMistake(
	'skirt-of-the-filter',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'reading',
		label: `through ${formatFrequency(rbwHz)}`,
		phrase: 'read your filter’s flank for phase noise',
		families: ['phase-noise'],
		shows: ({ setUp }, context) => showsCarrier(context, setUp),
		fromReading: ({ planeValue }) => planeValue,
		predict(context, setUp) {
			if (!showsCarrier(context, setUp)) return null;
			const value = shownReading(context, setUp, askedReading(context));
			return value === null ? null : { value, spread: 3 * modelSpread(context.question) };
		},
		explain({ setUp, yours, ...context }) {
			const { question } = context;
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			const offsetHz = offsetHzOf(context);
			const lossDb = filterLossDb(offsetHz, used);
			return {
				title: 'That flank is your filter’s',
				text: `${formatFrequency(offsetHz)} from the carrier a filter of ${formatFrequency(used)} is only ${figure(lossDb, 1)} dB down. What you read as noise is the carrier itself, seen down its flank. Narrow the filter until the number stands still.`,
				sum: `12.04 × (${figure(offsetHz, 0)} / ${figure(used, 0)})² = ${figure(lossDb, 1)} dB down; you gave ${figure(yours, question.digits)} ${question.unit}`,
				part: 'the carrier, through the filter’s flank',
				bad: {
					at: 'set-up',
					text: `Here: resolution ${formatFrequency(used)}; a tenth of the offset or less`
				}
			};
		},
		make: (steps, { question }) =>
			withoutSum(withSettings(steps, { rbwHz, vbwHz: 'auto', sweepTimeS: 'auto' }), question.id)
	})
);
