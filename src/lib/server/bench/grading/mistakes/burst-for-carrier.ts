import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { comingAndGoing, isBurst } from '../coming-and-going';
import { defineMistake } from '../mistake';
import { withSettings, withSweeps } from '../spoil';
import { modelSpread } from '../spreads';

/** Sweeps enough to meet a burst however rarely it comes, as quick as the filter lets them be. */
const PATIENT = 240;

/** The level of what comes and goes reported as that of what stands beneath it all the time. */
export const burstForCarrier = defineMistake('burst-for-carrier', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'the other carrier',
	phrase: 'read the carrier that comes and goes',
	families: ['point'],
	shows(source, context) {
		const found = comingAndGoing(context, source.setUp);
		return found !== null && source.setUp.trace.mode !== 'average' && isBurst(source.planeValue, found);
	},
	predict(context, setUp) {
		const found = setUp.trace.mode === 'max-hold' ? comingAndGoing(context, setUp) : null;
		// both carriers beat: their sum swells by up to twice their ratio
		return found && { value: found.onDbm, spread: 1.5 * modelSpread(context.question) };
	},
	explain({ setUp, yours, ...context }) {
		const found = setUp ? comingAndGoing(context, setUp) : null;
		const { digits, unit } = context.question;
		const held = setUp?.trace.mode === 'max-hold';
		const offDbm = found?.offDbm ?? context.question.truth;
		return {
			title: 'A held maximum shows who shouts',
			text: `${held ? 'The trace kept the highest level that was ever met' : 'The sweep passed while both were on'}, and what it shows belongs to the carrier that comes and goes. What is there all the time is what is left at the least: hold the minimum.`,
			sum: `${figure(yours, digits)} ${unit} with both, ${figure(offDbm, digits)} ${unit} while the other is silent`,
			part: 'the carrier that comes and goes',
			bad: {
				at: 'set-up',
				text: `Here: the trace ${held ? 'holds its maximum' : 'is live'}; hold the minimum`
			}
		};
	},
	make: (steps) =>
		withSweeps(
			withSettings(steps, { traces: [{ mode: 'max-hold' }], detector: 'positive-peak', sweepTimeS: 'auto' }),
			PATIENT
		)
}));
