import { z } from 'zod';
import type { ReadingRequest } from '$lib/measure/reading-request';
import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { askedReading } from '../asked-reading';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { setUpOf } from '../set-up-of';
import { shownPrediction, shownReading } from '../shown-reading';
import { withReading, withSettings } from '../spoil';
import { wideText, widthText } from '../width-words';

/** The width asked, without a window: of all that is swept. */
function unwindowed({ quantity }: NumberQuestion): ReadingRequest {
	if (quantity.kind === 'x-db-bandwidth') return { kind: 'x-db-bandwidth', db: quantity.db };
	const { percent } = quantity as Extract<typeof quantity, { kind: 'occupied-bandwidth' }>;
	return { kind: 'occupied-bandwidth', percent };
}

/** What of the trace a reading looked at, Hz. */
const seenHz = ({ resolved }: SetUp, request: ReadingRequest): number =>
	request.kind === 'occupied-bandwidth' && request.widthHz !== undefined
		? Math.min(request.widthHz, resolved.spanHz)
		: resolved.spanHz;

/** Whether something beside the signal moves a width read over so much by more than half of what is right. */
function takesInMore(context: Context, setUp: SetUp, request: ReadingRequest): boolean {
	const { drawn, question } = context;
	const { tolerance, truth } = question;
	const taughtHz = seenHz(setUpOf(drawn, drawn.method, question.id), askedReading(context));
	if (seenHz(setUp, request) < 1.1 * taughtHz) return false;
	const value = shownReading(context, setUp, request);
	return value !== null && value - truth > tolerance / 2;
}

/** A width read over so much of the spectrum that a neighbour, or the receiver's noise, counts as signal. */
export const windowTooWide = defineMistake(
	'window-too-wide',
	z.strictObject({ widthHz: z.number().positive() }),
	({ widthHz }) => ({
		stage: 'reading',
		label: `over ${widthText(widthHz)}`,
		phrase: 'let the window take in more than the signal',
		families: ['occupied-bandwidth', 'x-db-bandwidth'],
		shows: ({ request, setUp }, context) =>
			request.kind === context.question.quantity.kind &&
			takesInMore(context, setUp, request as ReadingRequest),
		predict(context, setUp) {
			const request = unwindowed(context.question);
			return takesInMore(context, setUp, request) ? shownPrediction(context, setUp, request) : null;
		},
		explain({ source, setUp, yours, question }) {
			const used = source && setUp ? seenHz(setUp, source.request as ReadingRequest) : widthHz;
			return {
				title: 'The window held more than the signal',
				text: `The reading counts everything it is shown. You showed it ${widthText(used)}, and what else is on the air there, or the receiver’s noise, was taken for part of the signal.`,
				sum: `${widthText(yours)} over ${widthText(used)}, ${widthText(question.truth)} for the signal alone: ${wideText(yours, question.truth)}`,
				part: 'what lies beside the signal',
				bad: {
					at: 'reading',
					text: `Here: ${widthText(used)} in view; give the reading a window that ends before the neighbour`
				}
			};
		},
		make: (steps, { question }) =>
			withReading(withSettings(steps, { spanHz: widthHz }), question.id, unwindowed(question))
	})
);
