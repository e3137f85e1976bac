import { formatFrequency, formatTime } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context } from '../mistake';
import { isPulseByPulse, pulseLossDb, pulsesOf } from '../pulses';
import { modelSpread } from '../spreads';
import { withSettings } from '../spoil';

/** What a filter takes off the pulse asked for, dB; 0 where nothing is pulsed. */
const lossDb = (context: Context, rbwHz: number): number => {
	const train = pulsesOf(context);
	return train ? pulseLossDb(train, rbwHz) : 0;
};

/** A pulse's level read through a filter too narrow to let it rise. */
export const pulseDesensitised = defineMistake(
	'pulse-desensitised',
	z.strictObject({ rbwHz: z.number().positive() }),
	({ rbwHz }) => ({
		stage: 'reading',
		label: `through ${formatFrequency(rbwHz)}`,
		phrase: 'read a pulse through a filter that never fills',
		families: ['point'],
		shows: ({ setUp }, context) => lossDb(context, setUp.resolved.rbwHz) > context.question.tolerance / 2,
		predict(context, { resolved }) {
			const lost = lossDb(context, resolved.rbwHz);
			if (lost <= context.question.tolerance / 2) return null;
			return { value: context.question.truth - lost, spread: 2 * modelSpread(context.question) };
		},
		explain({ setUp, yours, ...context }) {
			const { digits, unit } = context.question;
			const used = setUp?.resolved.rbwHz ?? rbwHz;
			const lost = lossDb(context, used);
			const train = pulsesOf(context);
			const widthS = train?.widthS ?? 0;
			const isPulses = train === undefined || isPulseByPulse(train, used);
			return {
				title: 'The filter had no time to fill',
				text: isPulses
					? `A filter of ${formatFrequency(used)} needs about ${formatTime(Number((1.5 / used).toPrecision(2)))} to fill, and the pulse is gone after ${formatTime(Number(widthS.toPrecision(3)))}. What you read is how far it got. The filter has to be wider than 1.5 over the pulse’s width.`
					: `A filter of ${formatFrequency(used)} is narrower than the pulses’ repetition: it shows one line of many. The middle one stands under the pulse by its share of time.`,
				sum: `${figure(yours, digits)} + ${figure(lost, 1)} = ${figure(yours + lost, digits)} ${unit}`,
				part: 'what the filter never showed of the pulse',
				bad: { at: 'set-up', text: `Here: resolution ${formatFrequency(used)}; wider` }
			};
		},
		make: (steps) => withSettings(steps, { rbwHz, vbwHz: 'auto' })
	})
);
