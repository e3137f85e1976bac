import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { figure } from '$lib/server/bench/exercise/figure';
import { askedReading } from '../asked-reading';
import { defineMistake } from '../mistake';
import { shownPrediction } from '../shown-reading';
import { withSettings } from '../spoil';
import { widthText } from '../width-words';

/** From this share of the width upwards the filter is to blame; common practice stays below 3 %. */
const LARGEST_SHARE = 0.05;

/** Through a filter that follows its symbols a signal strays more than noise would. */
const SYMBOLS = 2;

const widthHzOf = ({ quantity, truth }: NumberQuestion): number =>
	// An edge is a place, not a width: the window it lies in says how wide things are.
	quantity.kind === 'occupied-bandwidth' && truth > (quantity.widthHz ?? Infinity)
		? quantity.widthHz! / 2
		: truth;

/** A width read through a filter that is wide against it: the filter smears power across the edges. */
export const wideResolution = defineMistake(
	'wide-resolution',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'reading',
		label: `through ${formatFrequency(rbwHz)}`,
		phrase: 'measured a width through a filter too wide for it',
		families: ['occupied-bandwidth', 'x-db-bandwidth'],
		shows: ({ setUp, request }, context) =>
			setUp.resolved.rbwHz > LARGEST_SHARE * widthHzOf(context.question) &&
			request.kind === context.question.quantity.kind,
		predict(context, setUp) {
			if (setUp.resolved.rbwHz <= LARGEST_SHARE * widthHzOf(context.question)) return null;
			const shown = shownPrediction(context, setUp, askedReading(context));
			return shown && { ...shown, spread: SYMBOLS * shown.spread };
		},
		explain({ setUp, question, change }) {
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			const widthHz = widthHzOf(question);
			return {
				title: 'The filter has smeared the edges',
				text: `Your trace is the signal seen through a ${formatFrequency(used)} filter, and the filter moves power outwards across the very edges you look for. A resolution of 1 to 3 % of the width leaves them where they are.`,
				sum: `${formatFrequency(used)} is ${figure((100 * used) / widthHz, 0)} % of ${widthText(widthHz)}: ${widthText(Math.abs(change))} too much`,
				part: `smeared by the ${formatFrequency(used)} filter`,
				bad: { at: 'set-up', text: `Here: resolution ${formatFrequency(used)}; take 1 to 3 % of the width` }
			};
		},
		make: (steps) => withSettings(steps, { rbwHz, vbwHz: 'auto', sweepTimeS: 'auto' })
	})
);
