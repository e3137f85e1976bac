import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { drawReceiverError } from '$lib/server/bench/receiver/receiver-error';
import { displayedHz } from '../displayed';
import { defineMistake, type Context } from '../mistake';
import { lineDbm } from '../other-carrier';
import { modelSpread } from '../spreads';
import { withReading } from '../spoil';

const toHz = ({ question }: Context): number => (question.quantity as { toHz?: number }).toHz ?? 0;

/** The level of one carrier, dBm, given for its distance in level from another, dB. */
export const levelForDifference = defineMistake('level-for-difference', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'level alone',
	phrase: 'gave a level where a difference is asked',
	families: ['point'],
	shows: () => true,
	predict: (context) => ({
		value:
			lineDbm(context, toHz(context)) +
			drawReceiverError(context.drawn.profile, context.drawn.seed).levelDb(toHz(context)),
		spread: 1.5 * modelSpread(context.question)
	}),
	explain({ question, drawn, yours }) {
		const { fromHz = 0 } = question.quantity as { fromHz?: number };
		const reference = lineDbm({ drawn }, fromHz);
		return {
			title: 'dBm is a level, dB a difference',
			text: 'Your number is one carrier’s own level. The order asks how far it stands from the other: take the other’s level off, or read both with one pair of markers.',
			sum: `${figure(yours, question.digits)} − (${figure(reference, question.digits)}) = ${figure(yours - reference, question.digits)} dB`,
			part: 'the level of the carrier compared with',
			bad: { at: 'reading', text: 'Here: one marker; a difference takes two' }
		};
	},
	make: (steps, context) =>
		withReading(steps, context.question.id, { kind: 'marker', atHz: displayedHz(context, toHz(context)) })
}));
