import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { partOf, type Part } from '$lib/schemas/part';
import { adjacentReading, askedOffset, askedSide } from '../adjacent';
import { partsOf } from '../asked';
import { defineMistake, type Context } from '../mistake';
import { shownPrediction } from '../shown-reading';
import { withReading } from '../spoil';

/** The side asked, at another offset. */
const beside = (context: Context, offsetHz: number): Part => ({ offsetHz, side: askedSide(context) });

/** Power beside the signal, added up at another offset than the one asked. */
export const wrongOffset = defineMistake(
	'wrong-offset',
	z.strictObject({ offsetHz: z.number().positive() }),
	({ offsetHz }) => ({
		stage: 'reading',
		label: `${formatFrequency(offsetHz)} away`,
		phrase: 'looked at the wrong offset',
		families: ['adjacent-channel'],
		shows: ({ request }, context) =>
			request.kind === 'adjacent-channel' &&
			request.offsets.every((one) => Math.abs(one.offsetHz / askedOffset(context).offsetHz - 1) > 0.02),
		fromReading: ({ reading, request }, context) => {
			const read = request.kind === 'adjacent-channel' ? request.offsets[0].offsetHz : offsetHz;
			return partOf(partsOf(reading), beside(context, read)) ?? reading.value;
		},
		predict(context, setUp) {
			const { drawn, question } = context;
			const there = { drawn, question: { ...question, part: beside(context, offsetHz) } };
			return shownPrediction(there, setUp, adjacentReading(context, { offsetHz }));
		},
		explain({ source, drawn, question, yours }) {
			const asked = askedOffset({ drawn, question });
			const read =
				source?.request.kind === 'adjacent-channel' ? source.request.offsets[0].offsetHz : offsetHz;
			return {
				title: 'The next channel is one spacing away',
				text: `You added up ${formatFrequency(read)} from the carrier. The order asks for ${formatFrequency(asked.offsetHz)}, where the neighbour’s channel is; what lies nearer is the signal’s own edge, what lies farther is another channel.`,
				sum: `${figure(yours, question.digits)} dBc at ${formatFrequency(read)}, ${figure(question.truth, question.digits)} dBc at ${formatFrequency(asked.offsetHz)}`,
				part: `${formatFrequency(read)} instead of ${formatFrequency(asked.offsetHz)}`,
				bad: {
					at: 'reading',
					text: `Here: ${formatFrequency(read)} away; the order says ${formatFrequency(asked.offsetHz)}`
				}
			};
		},
		make: (steps, context) =>
			withReading(
				steps,
				context.question.id,
				adjacentReading(context, { offsetHz }),
				undefined,
				beside(context, offsetHz)
			)
	})
);
