import { z } from 'zod';
import { partOf } from '$lib/schemas/part';
import { truth } from '$lib/server/bench/truth/truth';
import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { defineMistake, type Context } from '../mistake';
import { ownError } from '../own-error';
import { readStepOf, withReading } from '../spoil';
import { widthText } from '../width-words';

/** The channel's centre: that of the window asked over. */
const channelHz = ({ frequencyHz }: NumberQuestion): number => frequencyHz;

/** An edge worked out from the width and the assigned frequency, as if the carrier stood there. */
export const edgeFromWidth = defineMistake('edge-from-width', z.strictObject({}), () => {
	const assumedHz = ({ drawn, question }: Context): number => {
		const { value } = truth(drawn.scene, question.quantity);
		return channelHz(question) + (question.part === 'lowerHz' ? -value : value) / 2;
	};
	// A right edge has this receiver's own frequency error in it; the channel's centre comes off the order and has none.
	const change = (context: Context) => assumedHz(context) - context.question.truth - ownError(context);
	return {
		stage: 'slip',
		label: 'half the width away',
		phrase: 'worked the edge out from the width',
		change,
		explain({ question, drawn }) {
			const { value, parts } = truth(drawn.scene, question.quantity);
			const middleHz = ((partOf(parts, 'lowerHz') ?? 0) + (partOf(parts, 'upperHz') ?? 0)) / 2;
			const offHz = middleHz - channelHz(question);
			return {
				title: 'A carrier need not stand in the middle of its channel',
				text: `You put half of the width on the channel’s centre. This carrier stands ${widthText(Math.abs(offHz))} ${offHz > 0 ? 'above' : 'below'} it, and its edge with it. The reading gives both edges: take the one asked.`,
				sum: `${widthText(value)}/2 = ${widthText(value / 2)} from the channel’s centre, but the carrier stands ${widthText(Math.abs(offHz))} ${offHz > 0 ? 'higher' : 'lower'}`,
				part: 'how far the carrier stands off its channel',
				bad: { at: 'answer', text: 'Here: the edge is not half a width from the channel’s centre' }
			};
		},
		make: (steps, { question }) => {
			const { reading } = readStepOf(steps, question.id);
			const side = question.part === 'lowerHz' ? -1 : 1;
			const whole = steps.map((step) =>
				step.do === 'read' && step.reading === reading ? { ...step, part: undefined } : step
			);
			return withReading(whole, question.id, reading, (value) => channelHz(question) + (side * value) / 2);
		}
	};
});
