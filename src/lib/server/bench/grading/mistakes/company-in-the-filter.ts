import { filterLossDb } from '$lib/measure/resolution-filter';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { displayedHz } from '../displayed';
import { defineMistake, type Context } from '../mistake';
import { lineDbm } from '../other-carrier';
import { said } from '../said';
import { modelSpread } from '../spreads';
import { withSettings } from '../spoil';

/** How far the other must stand above the one asked, inside the filter, to be what is counted, dB. */
const CLEARLY_DB = 6;

/** By how much the other carrier is the stronger one behind a filter of `rbwHz` that stands on the one asked, dB. */
const strongerDb = (context: Context, strongHz: number, rbwHz: number): number =>
	lineDbm(context, strongHz) -
	lineDbm(context, context.question.frequencyHz) -
	filterLossDb(strongHz - context.question.frequencyHz, rbwHz);

/** A count with a stronger carrier inside the resolution bandwidth: that one is counted. */
export const companyInTheFilter = defineMistake(
	'company-in-the-filter',
	z.strictObject({ strongHz: z.number().positive(), rbwHz: z.number().positive() }),
	({ strongHz, rbwHz }) => ({
		stage: 'reading',
		label: 'stronger one counted',
		phrase: 'counted a stronger carrier inside your filter',
		families: ['count'],
		shows: ({ setUp, reading }, context) =>
			strongerDb(context, strongHz, setUp.resolved.rbwHz) > CLEARLY_DB &&
			Math.abs(reading.value - displayedHz(context, strongHz)) <= context.question.tolerance,
		predict: (context, { resolved }) =>
			strongerDb(context, strongHz, resolved.rbwHz) > CLEARLY_DB
				? { value: strongHz, spread: modelSpread(context.question) }
				: null,
		explain({ question, drawn, setUp }) {
			const width = formatFrequency(setUp?.resolved.rbwHz ?? rbwHz);
			const apart = Math.abs(strongHz - question.frequencyHz);
			return {
				title: 'A count follows the strongest in the filter',
				text: `Your resolution bandwidth was ${width}, and a carrier ${formatFrequency(Math.round(apart))} away is ${Math.round(lineDbm({ drawn }, strongHz) - lineDbm({ drawn }, question.frequencyHz))} dB stronger. The counter followed that one. Narrow the filter until only one carrier is in it.`,
				sum: `${said(strongHz, question)} counted, ${said(question.truth, question)} asked`,
				part: 'from the stronger carrier to the one asked',
				bad: { at: 'set-up', text: `Here: resolution ${width}, with two carriers inside` }
			};
		},
		make: (steps) => withSettings(steps, { rbwHz })
	})
);
