import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { isPulseByPulse, pulsesOf } from '../pulses';
import { said } from '../said';
import { setUpOf } from '../set-up-of';
import { withSettings, withSum } from '../spoil';

/** Hertz that the sweep passes in a second; 0 where the filter shows lines and not pulses. */
function passedHzPerS(context: Context, { resolved }: SetUp): number {
	const train = pulsesOf(context);
	if (!train || !isPulseByPulse(train, resolved.rbwHz)) return 0;
	return resolved.spanHz / resolved.sweepTimeS;
}

/** The distance on the screen between spikes that single pulses wrote, given for the repetition. */
export const spikesForLines = defineMistake(
	'spikes-for-lines',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'slip',
		label: 'spikes for lines',
		phrase: 'took single pulses for lines',
		change(context, setUp, source) {
			const passed = setUp ? passedHzPerS(context, setUp) : 0;
			const repetitionHz = source?.cleanValue ?? context.question.truth;
			return passed > 0 ? passed / repetitionHz - repetitionHz : null;
		},
		// where on its bucket a spike is written, over some tens of them
		spread: (context, setUp) => (0.01 * passedHzPerS(context, setUp)) / context.question.truth,
		explain({ setUp, yours, ...context }) {
			const { question } = context;
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			const passed = setUp ? passedHzPerS(context, setUp) : yours * question.truth;
			return {
				title: 'Those were pulses, not lines',
				text: `Through ${formatFrequency(used)}, wider than the repetition, every pulse writes a spike wherever the sweep stands when it comes. Their distance in hertz is how far the sweep got from one pulse to the next: it changes with the sweep time, and a line’s doesn’t.`,
				sum: `${figure(passed / 1e6, 1)} MHz/s ÷ ${said(yours, question)} = ${said(passed / yours, question)}`,
				part: 'how far the sweep got, not how often the pulses come',
				bad: {
					at: 'answer',
					text: `Here: spikes through ${formatFrequency(used)}; change the sweep time and they move`
				}
			};
		},
		make(steps, context) {
			const wide = withSettings(steps, { rbwHz, vbwHz: 'auto', sweepTimeS: 'auto' });
			const passed = passedHzPerS(context, setUpOf(context.drawn, wide, context.question.id));
			return withSum(wide, context.question.id, (value) => passed / value);
		}
	})
);
