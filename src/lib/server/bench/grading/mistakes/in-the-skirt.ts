import { filterLossDb } from '$lib/measure/resolution-filter';
import { dbToPowerRatio, powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { displayedHz } from '../displayed';
import { defineMistake, type Context } from '../mistake';
import { lineDbm } from '../other-carrier';
import { modelSpread } from '../spreads';
import { withReading, withSettings } from '../spoil';

/** How far the skirt must stand over the weak carrier to hide it, dB. */
const HIDDEN_DB = 6;

const weakHz = ({ question }: Context): number => {
	const { atHz, toHz } = question.quantity as { atHz?: number; toHz?: number };
	return atHz ?? toHz ?? 0;
};

/** By how much the strong carrier's skirt stands over the weak carrier, at the weak one's place, dB. */
const skirtOverDb = (context: Context, strongHz: number, rbwHz: number): number =>
	lineDbm(context, strongHz) -
	filterLossDb(weakHz(context) - strongHz, rbwHz) -
	lineDbm(context, weakHz(context));

/** A weak carrier's level read where a wide filter shows nothing but the strong one's skirt. */
export const inTheSkirt = defineMistake(
	'in-the-skirt',
	z.strictObject({ strongHz: z.number().positive(), rbwHz: z.number().positive() }),
	({ strongHz, rbwHz }) => ({
		stage: 'reading',
		label: 'the filter’s skirt',
		phrase: 'read the filter’s skirt for a carrier',
		families: ['point', 'delta'],
		shows: ({ setUp }, context) => skirtOverDb(context, strongHz, setUp.resolved.rbwHz) > HIDDEN_DB,
		predict(context, { resolved }) {
			const over = skirtOverDb(context, strongHz, resolved.rbwHz);
			if (over <= HIDDEN_DB) return null;
			// both at once: their powers add in the mean, their beat swings about it by √2·8.7 dB times the weak one's share
			const weak = dbToPowerRatio(-over);
			const beatDb = (20 / Math.LN10) * Math.sqrt(weak / 2);
			return {
				value: context.question.truth + over + powerRatioToDb(1 + weak),
				spread: Math.hypot(modelSpread(context.question), beatDb)
			};
		},
		explain({ question, drawn, setUp }) {
			const context = { question, drawn };
			const width = setUp?.resolved.rbwHz ?? rbwHz;
			const apartHz = Math.abs(weakHz(context) - strongHz);
			const lossDb = filterLossDb(apartHz, width);
			return {
				title: 'What you read is your own filter',
				text: `At ${formatFrequency(Math.round(apartHz))} from the strong carrier a filter of ${formatFrequency(width)} is only ${figure(lossDb, 1)} dB down. The weak carrier lies ${figure(lineDbm(context, strongHz) - lineDbm(context, weakHz(context)), 1)} dB down, deep inside that skirt. Narrow the filter until what you read stops changing.`,
				sum: `12.04 × (${figure(apartHz, 0)} / ${figure(width, 0)})² = ${figure(lossDb, 1)} dB down`,
				part: 'the skirt over the carrier',
				bad: { at: 'set-up', text: `Here: resolution ${formatFrequency(width)}; narrower` }
			};
		},
		make(steps, context) {
			const wide = withSettings(steps, { rbwHz });
			const { quantity, id } = context.question;
			if (quantity.kind === 'delta') return wide;
			return withReading(wide, id, { kind: 'marker', atHz: displayedHz(context, weakHz(context)) });
		}
	})
);
