import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import type { BenchRequest } from '$lib/schemas/reading';
import { displayedHz } from '../displayed';
import type { Source } from '../evidence';
import { defineMistake, type Context } from '../mistake';
import { truthAt } from '../other-carrier';
import { placeHz } from '../place';
import { said } from '../said';
import { modelSpread, pointsSpread } from '../spreads';
import { withReading, withSettings } from '../spoil';

/** The carriers that a question asks of; of a delta, the one compared with first. */
function askedHz(quantity: { kind: string }): number[] {
	const { atHz, fromHz, toHz } = quantity as { atHz?: number; fromHz?: number; toHz?: number };
	return [fromHz, toHz, atHz].filter((hz) => hz !== undefined);
}

/** The frequencies that a reading stands on: a marker's, a count's, both of a delta. */
function placesOf({ reading, request }: Source): number[] {
	if (request.kind === 'delta') return [request.fromHz, request.toHz].filter((hz) => hz !== undefined);
	const place = placeHz(reading);
	return place === undefined ? [] : [place];
}

/** The reading that asks of the carrier shown at `atHz` what the question asks of its own. */
function readingAt(context: Context, atHz: number): BenchRequest {
	const { quantity } = context.question;
	if (quantity.kind === 'delta') {
		return {
			kind: 'delta',
			fromHz: displayedHz(context, quantity.fromHz),
			toHz: displayedHz(context, atHz)
		};
	}
	if (quantity.kind === 'count') return { kind: 'count', atHz: displayedHz(context, atHz), gateS: 0.5 };
	return { kind: 'marker', atHz: displayedHz(context, atHz) };
}

/** The marker, or the counter, on another carrier than the one asked for. Found by looking at it with centre and span, where the method doesn't show it. */
export const wrongCarrier = defineMistake(
	'wrong-carrier',
	z.strictObject({
		atHz: z.number().positive(),
		centreHz: z.number().positive().optional(),
		spanHz: z.number().positive().optional()
	}),
	({ atHz, centreHz, spanHz }) => ({
		stage: 'reading',
		label: `carrier at ${formatFrequency(atHz, 3)}`,
		phrase: `read the carrier at ${formatFrequency(atHz, 3)}`,
		families: ['point', 'count', 'delta'],
		shows(source, context) {
			const { rbwHz, spanHz: shown, points } = source.setUp.resolved;
			const reach = Math.max(rbwHz, (1.5 * shown) / (points - 1));
			const away = (hz: number, trueHz: number) => Math.abs(hz - displayedHz(context, trueHz));
			const asked = askedHz(context.question.quantity);
			return placesOf(source).some(
				(hz) => away(hz, atHz) <= reach && asked.every((place) => away(hz, atHz) < away(hz, place))
			);
		},
		predict: (context, setUp) => ({
			value: truthAt(context, atHz),
			spread: Math.hypot(modelSpread(context.question), pointsSpread(context.question, setUp))
		}),
		explain({ question, drawn, yours }) {
			const other = truthAt({ question, drawn }, atHz);
			return {
				title: 'Another carrier than the one asked for',
				text: `Your number belongs to the carrier at ${formatFrequency(atHz, 3)}. The order asks for the one at ${formatFrequency(askedHz(question.quantity).at(-1) ?? 0, 3)}. The highest, the next highest and the next in frequency are different things: look at where the marker stands, not only at what it reads.`,
				sum: `there ${said(other, question)}, here ${said(question.truth, question)}: ${said(yours - question.truth, question)} between yours and the true one`,
				part: 'from one carrier to the other',
				bad: { at: 'reading', text: `Here: the carrier at ${formatFrequency(atHz, 3)}` }
			};
		},
		make(steps, context) {
			const looking = spanHz === undefined ? steps : withSettings(steps, { centreHz, spanHz });
			return withReading(looking, context.question.id, readingAt(context, atHz));
		}
	})
);
