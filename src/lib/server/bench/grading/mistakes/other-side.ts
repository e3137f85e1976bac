import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { partOf } from '$lib/schemas/part';
import { truth } from '$lib/server/bench/truth/truth';
import { askedOffset, askedSide } from '../adjacent';
import { defineMistake, type Context } from '../mistake';
import { readStepOf, withReading } from '../spoil';

const otherSide = (context: Context) => ({
	offsetHz: askedOffset(context).offsetHz,
	side: askedSide(context) === 'lower' ? ('upper' as const) : ('lower' as const)
});
const otherDbc = (context: Context): number =>
	partOf(truth(context.drawn.scene, context.question.quantity).parts, otherSide(context)) ??
	context.question.truth;

/** The channel on the other side than the one asked: a neighbour's own carrier, perhaps, given as leakage. */
export const otherSideRead = defineMistake('other-side', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'the other side',
	phrase: 'gave the other side',
	change: (context) => otherDbc(context) - context.question.truth,
	explain({ yours, ...context }) {
		const { question } = context;
		const asked = askedSide(context) === 'lower' ? 'below' : 'above';
		return {
			title: 'What stands in the next channel may be its owner’s',
			text: `The order asks for the channel ${asked}. You gave the one on the other side, and what is there belongs in part to somebody else: a neighbour’s carrier in his own channel is not your leakage.`,
			sum: `${figure(yours, question.digits)} dBc on the other side, ${figure(question.truth, question.digits)} dBc ${asked}`,
			part: 'the channel on the other side',
			bad: { at: 'answer', text: `Here: the order asks for the channel ${asked}` }
		};
	},
	make(steps, context) {
		const { reading } = readStepOf(steps, context.question.id);
		return withReading(steps, context.question.id, reading, undefined, otherSide(context));
	}
}));
