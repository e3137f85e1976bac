import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { neighbourHz } from '../adjacent';
import { defineMistake, type Context } from '../mistake';
import { shownPrediction } from '../shown-reading';
import { withReading } from '../spoil';

const between = (context: Context) => ({
	kind: 'delta' as const,
	fromHz: context.question.frequencyHz,
	toHz: neighbourHz(context)
});

/** The difference of two markers given for the ratio of two band powers: two densities at two places. */
export const markersForBands = defineMistake('markers-for-bands', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'two markers',
	phrase: 'compared two points where two channels are asked',
	families: ['delta'],
	shows: () => true,
	fromReading: ({ reading }) => -Math.abs(reading.value),
	predict: (context, setUp) => shownPrediction(context, setUp, between(context)),
	explain: ({ yours, question }) => ({
		title: 'Two points are not two channels',
		text: 'The difference of two markers compares what one filter holds at two places. A skirt falls across the next channel, so one point of it says little of what the whole channel takes up, and the own channel isn’t filled to its edges.',
		sum: `${figure(yours, question.digits)} dB between the points, ${figure(question.truth, question.digits)} dBc between the channels`,
		part: 'points instead of channels',
		bad: { at: 'reading', text: 'Here: two markers; the order asks for the power of two channels' }
	}),
	make: (steps, context) => withReading(steps, context.question.id, between(context))
}));
