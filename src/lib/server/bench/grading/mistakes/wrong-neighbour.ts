import { partOf } from '$lib/schemas/part';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { BenchError } from '$lib/server/bench/bench-error';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';
import { truth } from '$lib/server/bench/truth/truth';
import { asksPlace } from '../asked';
import { askedName } from '../describe-reading';
import type { Source } from '../evidence';
import { familyOf } from '../family';
import { defineMistake, type Context } from '../mistake';
import { moved, movedReading } from '../move-request';
import { takenAtHz } from '../place';
import { readStepOf, withReading } from '../spoil';
import { modelSpread, shownDigits } from '../spreads';

/** What was asked, of the signal at `atHz`; null where that has no such thing. */
function ofNeighbour({ drawn, question }: Context, atHz: number): number | null {
	try {
		const there = truth(drawn.scene, moved(question.quantity, atHz - question.frequencyHz));
		return (question.part === undefined ? there.value : partOf(there.parts, question.part)) ?? null;
	} catch (cause) {
		if (cause instanceof BenchError) return null;
		throw cause;
	}
}

/** Of the kind asked for, so that only its place can be wrong. */
const rightKind = ({ family }: Source, { question }: Context): boolean =>
	family === familyOf(question.quantity.kind) ||
	(asksPlace(question) && (family === 'point' || family === 'count'));

/** The right reading of the wrong signal: the one at `atHz`, beside the one asked for. */
export const wrongNeighbour = defineMistake(
	'wrong-neighbour',
	z.strictObject({ atHz: z.number().positive() }),
	({ atHz }) => ({
		stage: 'reading',
		label: 'the neighbour',
		phrase: 'measured the neighbour',
		families: 'all',
		shows(source, context) {
			const takenHz = takenAtHz(source);
			if (takenHz === undefined || !rightKind(source, context)) return false;
			return Math.abs(takenHz - atHz) < Math.abs(takenHz - context.question.frequencyHz);
		},
		predict(context) {
			const value = ofNeighbour(context, atHz);
			return value === null ? null : { value, spread: modelSpread(context.question) };
		},
		explain({ source, question, yours }) {
			const takenHz = (source && takenAtHz(source)) ?? atHz;
			const wanted = formatFrequency(question.frequencyHz);
			const digits = shownDigits(question);
			return {
				title: 'That is the signal beside it',
				text: `Your order asks about the signal at ${wanted}. Your reading was taken at ${formatFrequency(takenHz)}, on the one beside it.`,
				sum: `${quantityText(yours, question.unit, digits)} at ${formatFrequency(takenHz)}, ${quantityText(question.truth, question.unit, digits)} at ${wanted}`,
				part: `${askedName(question)} of the neighbour, not of the signal asked for`,
				bad: { at: 'reading', text: `Here: on the neighbour; the order says ${wanted}` }
			};
		},
		make(steps, { question }) {
			const { reading } = readStepOf(steps, question.id);
			const byHz = atHz - question.frequencyHz;
			return withReading(steps, question.id, movedReading(reading, byHz, atHz));
		}
	})
);
