import { z } from 'zod';
import { shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { shownPrediction } from '../shown-reading';
import { withReading } from '../spoil';
import { cutText, wideText, widthText } from '../width-words';

/** A width x dB under the top where another is asked: half-power points for 99 %, or another x. */
export const widthAtLevel = defineMistake(
	'width-at-level',
	z.strictObject({ db: z.number().positive().max(200) }),
	({ db }) => {
		const request = { kind: 'x-db-bandwidth', db } as const;
		return {
			stage: 'reading',
			label: `${shortFigure(db, 2)} dB down`,
			phrase: `measured the width ${shortFigure(db, 2)} dB under the top`,
			families: ['x-db-bandwidth'],
			shows: ({ request: read }, { question: { quantity } }) =>
				read.kind === 'x-db-bandwidth' &&
				Math.abs(read.db - db) < 1.5 &&
				!(quantity.kind === 'x-db-bandwidth' && Math.abs(read.db - quantity.db) < 0.5),
			predict: (context, setUp) => shownPrediction(context, setUp, request),
			explain({ source, yours, question }) {
				const read = source?.request.kind === 'x-db-bandwidth' ? source.request.db : db;
				return {
					title: 'Another cut gives another width',
					text: `You measured between the points ${shortFigure(read, 2)} dB under the top. The order asks for ${cutText(question)}. They are two different widths, and how far they lie apart depends on the signal’s shape.`,
					sum: `${widthText(yours)} ${shortFigure(read, 2)} dB under the top, ${widthText(question.truth)} for ${cutText(question)}: ${wideText(yours, question.truth)}`,
					part: `the difference between ${shortFigure(read, 2)} dB and ${cutText(question)}`,
					bad: {
						at: 'reading',
						text: `Here: ${shortFigure(read, 2)} dB down; the order says ${cutText(question)}`
					}
				};
			},
			make: (steps, { question }) => withReading(steps, question.id, request)
		};
	}
);
