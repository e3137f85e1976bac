import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { shownReading } from '../shown-reading';
import { modelSpread } from '../spreads';
import { withReading } from '../spoil';

/** The strongest line of a modulated carrier given for the power of them all. */
export const oneLineForAll = defineMistake('one-line-for-all', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'strongest line',
	phrase: 'read the strongest line for the whole power',
	families: ['point'],
	shows: () => true,
	predict(context, setUp) {
		const value = shownReading(context, setUp, { kind: 'peak' });
		return value === null ? null : { value, spread: 2 * modelSpread(context.question) };
	},
	explain({ yours, question }) {
		const { digits, unit, truth } = question;
		return {
			title: 'One line of many',
			text: 'Modulation shares the power out among carrier and sidebands. In frequency modulation the sum stays the same whatever the index, even where the carrier has vanished; no single line is it. Add the lines up: a power in a band that holds them all.',
			sum: `strongest line ${figure(yours, digits)} ${unit}, all lines ${figure(truth, digits)} ${unit}`,
			part: 'the other lines’ power',
			bad: { at: 'reading', text: 'Here: one line; take the power in a band' }
		};
	},
	make: (steps, { question }) => withReading(steps, question.id, { kind: 'peak' })
}));
