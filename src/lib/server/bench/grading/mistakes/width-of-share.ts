import { z } from 'zod';
import { shortFigure } from '$lib/server/bench/exercise/figure';
import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { defineMistake } from '../mistake';
import { shownPrediction } from '../shown-reading';
import { withReading } from '../spoil';
import { cutText, wideText, widthText } from '../width-words';

/** The same window with another share; for a question that has none, over all that is swept. */
const requestFor = ({ quantity }: NumberQuestion, percent: number) => ({
	...(quantity.kind === 'occupied-bandwidth' &&
		quantity.centreHz !== undefined && { centreHz: quantity.centreHz, widthHz: quantity.widthHz }),
	kind: 'occupied-bandwidth' as const,
	percent
});

/** The width that holds another share of the power than the one asked, or a share where x dB are asked. */
export const widthOfShare = defineMistake(
	'width-of-share',
	z.strictObject({ percent: z.number().gt(0).lt(100) }),
	({ percent }) => ({
		stage: 'reading',
		label: `${shortFigure(percent, 2)} %`,
		phrase: `took ${shortFigure(percent, 2)} % of the power`,
		families: ['occupied-bandwidth'],
		shows: ({ request }, { question: { quantity } }) =>
			request.kind === 'occupied-bandwidth' &&
			Math.abs(request.percent - percent) < 0.5 &&
			!(quantity.kind === 'occupied-bandwidth' && Math.abs(request.percent - quantity.percent) < 0.05),
		predict: (context, setUp) => shownPrediction(context, setUp, requestFor(context.question, percent)),
		explain: ({ yours, question }) => ({
			title: 'The share belongs to the number',
			text: `Your width holds ${shortFigure(percent, 2)} % of the power. The order asks for ${cutText(question)}, and no width says by itself how much it holds.`,
			sum: `${widthText(yours)} for ${shortFigure(percent, 2)} %, ${widthText(question.truth)} for ${cutText(question)}: ${wideText(yours, question.truth)}`,
			part: `the difference between ${shortFigure(percent, 2)} % and ${cutText(question)}`,
			bad: {
				at: 'reading',
				text: `Here: ${shortFigure(percent, 2)} %; the order says ${cutText(question)}`
			}
		}),
		make: (steps, { question }) => withReading(steps, question.id, requestFor(question, percent))
	})
);
