import { z } from 'zod';
import { powerRatioToDb } from '$lib/units/decibel';
import { figure } from '$lib/server/bench/exercise/figure';
import { averagedDbm, averagedSpreadDb, comingAndGoing } from '../coming-and-going';
import { defineMistake, type SetUp } from '../mistake';
import { withSettings, withSweeps } from '../spoil';
import { modelSpread } from '../spreads';

const SWEEPS = 240;
const isAveraged = ({ trace, sweeps }: SetUp): boolean => trace.mode === 'average' && sweeps > 1;

/** Sweeps averaged over what comes and goes: neither its level while on nor what stands beneath it. */
export const averagedOverBursts = defineMistake('averaged-over-bursts', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'averaged over time',
	phrase: 'averaged over on and off',
	families: ['point'],
	shows: ({ setUp }, context) => isAveraged(setUp) && comingAndGoing(context, setUp) !== null,
	predict(context, setUp) {
		const found = isAveraged(setUp) ? comingAndGoing(context, setUp) : null;
		if (!found) return null;
		const spread = Math.hypot(modelSpread(context.question), averagedSpreadDb(found, setUp));
		return { value: averagedDbm(found, setUp), spread };
	},
	explain({ setUp, ...context }) {
		const found = setUp ? comingAndGoing(context, setUp) : null;
		const { truth, digits, unit } = context.question;
		const shareDb = powerRatioToDb(found?.share ?? 1);
		const on = figure(found?.onDbm ?? truth, digits);
		return {
			title: 'A mean over on and off is neither',
			text: `The trace averaged sweeps that met the burst with sweeps that met its silence. It is on for ${figure(100 * (found?.share ?? 1), 1)} % of the time, so its mean power stands ${figure(-shareDb, 1)} dB under its level while on, and covers what stands beneath it.`,
			sum: `${on} + 10 log (${figure(found?.share ?? 1, 4)}) = ${figure((found?.onDbm ?? truth) + shareDb, digits)} ${unit}`,
			part: 'averaged over on and off',
			bad: { at: 'set-up', text: 'Here: trace average; hold the maximum or the minimum' }
		};
	},
	make: (steps) => withSweeps(withSettings(steps, { traces: [{ mode: 'average', count: SWEEPS }] }), SWEEPS)
}));
