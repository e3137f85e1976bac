import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { adjacentReading, askedOffset } from '../adjacent';
import { defineMistake } from '../mistake';
import { sameWidth } from '../read-width';
import { shownPrediction } from '../shown-reading';
import { withReading } from '../spoil';

/** Power beside the signal, added up over another width than the one asked. */
export const neighbourWidth = defineMistake(
	'neighbour-width',
	z.strictObject({ widthHz: z.number().positive() }),
	({ widthHz }) => ({
		stage: 'reading',
		label: `over ${formatFrequency(widthHz)}`,
		phrase: 'added up the wrong width of the next channel',
		families: ['adjacent-channel'],
		shows({ request }, context) {
			const asked = askedOffset(context).widthHz;
			return (
				request.kind === 'adjacent-channel' &&
				request.offsets.every(
					(one) => !sameWidth(one.widthHz, asked) && one.widthHz > asked === widthHz > asked
				)
			);
		},
		predict: (context, setUp) => shownPrediction(context, setUp, adjacentReading(context, { widthHz })),
		explain({ source, drawn, question, yours }) {
			const asked = askedOffset({ drawn, question });
			const read = source?.request.kind === 'adjacent-channel' ? source.request.offsets[0].widthHz : widthHz;
			return {
				title: 'How much leaks depends on how much you add up',
				text: `You added up ${formatFrequency(read)} of the next channel. The order asks for ${formatFrequency(asked.widthHz)} of it; a ratio without its widths can’t be compared with anything.`,
				sum: `${figure(yours, question.digits)} dBc in ${formatFrequency(read)}, ${figure(question.truth, question.digits)} dBc in ${formatFrequency(asked.widthHz)}`,
				part: `${formatFrequency(read)} instead of ${formatFrequency(asked.widthHz)}`,
				bad: {
					at: 'reading',
					text: `Here: ${formatFrequency(read)}; the order says ${formatFrequency(asked.widthHz)}`
				}
			};
		},
		make: (steps, context) => withReading(steps, context.question.id, adjacentReading(context, { widthHz }))
	})
);
