import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { carrierSpreadDb, comingAndGoing, isBurst } from '../coming-and-going';
import { defineMistake, type SetUp } from '../mistake';
import { shortTime } from '../on-and-period';
import { withSettings, withSweeps } from '../spoil';
import { modelSpread } from '../spreads';

const isLive = ({ trace }: SetUp): boolean => trace.mode === 'live' || trace.mode === 'kept';

/** One sweep that passed while nothing was on: what stands underneath, reported as the level of what comes and goes. */
export const burstMissed = defineMistake('burst-missed', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'missed it',
	phrase: 'looked while it was off',
	families: ['point'],
	shows(source, context) {
		const found = comingAndGoing(context, source.setUp);
		return found !== null && isLive(source.setUp) && !isBurst(source.planeValue, found);
	},
	predict(context, setUp) {
		const found = isLive(setUp) ? comingAndGoing(context, setUp) : null;
		if (!found) return null;
		const noisy = carrierSpreadDb(context, setUp, found.offDbm);
		return { value: found.offDbm, spread: Math.hypot(modelSpread(context.question), noisy) };
	},
	explain({ setUp, ...context }) {
		const found = setUp ? comingAndGoing(context, setUp) : null;
		const { digits, unit, truth } = context.question;
		const gate = found?.gate;
		const sharePercent = figure(100 * (found?.share ?? 0), 0);
		return {
			title: 'One sweep is one moment',
			text: `A live trace shows the last sweep only, and that one passed while the signal was off. ${gate ? `It is on for ${shortTime(gate.onS)} and silent for ${shortTime(gate.offS)}: one look in ${figure(1 / (found?.share ?? 1), 0)} meets it.` : ''} Hold the maximum over many quick sweeps.`.replaceAll(
				'  ',
				' '
			),
			sum: `on ${sharePercent} % of the time; ${figure(found?.offDbm ?? truth, digits)} ${unit} beneath it, ${figure(truth, digits)} ${unit} while on`,
			part: 'the signal, which was off',
			bad: { at: 'set-up', text: 'Here: trace live; hold the maximum' }
		};
	},
	make: (steps) => withSweeps(withSettings(steps, { traces: [{ mode: 'live' }] }), 1)
}));
