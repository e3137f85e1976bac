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
		const onDbm = found?.onDbm ?? truth;
		const share = found?.share ?? 1;
		const percent = figure(100 * share, 1);
		const meanDbm = found && setUp ? averagedDbm(found, setUp) : truth;
		const onPower = setUp?.resolved.scale === 'power';
		const below = figure(onDbm - meanDbm, 1);
		return {
			title: 'A mean over on and off is neither',
			text: `The trace averaged sweeps that met the burst with sweeps that met its silence. It is on for ${percent} % of the time, so ${onPower ? 'its mean power' : 'such a mean'} stands ${below} dB under its level while on, and hides what stands beneath it.`,
			sum: onPower
				? `${figure(onDbm, digits)} + 10 log (${figure(share, 4)}) = ${figure(onDbm + powerRatioToDb(share), digits)} ${unit}`
				: `${percent} % of ${figure(onDbm, digits)} and the rest of ${figure(found?.offDbm ?? truth, digits)}: ${figure(meanDbm, digits)} ${unit}`,
			part: 'averaged over on and off',
			bad: { at: 'set-up', text: 'Here: trace average; hold the maximum or the minimum' }
		};
	},
	make: (steps) => withSweeps(withSettings(steps, { traces: [{ mode: 'average', count: SWEEPS }] }), SWEEPS)
}));
