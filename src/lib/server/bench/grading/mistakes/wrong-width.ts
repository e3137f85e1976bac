import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context } from '../mistake';
import { bandSpreadDb } from '../noise-law';
import { sameWidth, widthHzOf } from '../read-width';
import { askedWidthHz, channelDbm } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

const askedOf = ({ question }: Context): number => askedWidthHz(question) as number;

/** Power added up over another width than the one asked: too narrow to hold the signal, or wide enough to take in a neighbour. */
export const wrongWidth = defineMistake(
	'wrong-width',
	z.strictObject({ widthHz: z.number().positive() }),
	({ widthHz }) => ({
		stage: 'reading',
		label: `over ${formatFrequency(widthHz)}`,
		phrase: 'added up the power over the wrong width',
		families: ['band'],
		shows(source, context) {
			const width = widthHzOf(source.request);
			const asked = askedOf(context);
			return width !== undefined && !sameWidth(width, asked) && width > asked === widthHz > asked;
		},
		predict(context, setUp) {
			const value = channelDbm(context, context.question.frequencyHz, widthHz);
			const noisy = bandSpreadDb(setUp, Math.min(widthHz, askedOf(context)));
			return { value, spread: Math.hypot(modelSpread(context.question), noisy) };
		},
		explain({ source, drawn, question }) {
			const context = { drawn, question };
			const asked = askedOf(context);
			const used = (source && widthHzOf(source.request)) ?? widthHz;
			const held = channelDbm(context, question.frequencyHz, used);
			const wide = used > asked;
			return {
				title: wide
					? 'Your bracket took in more than the channel'
					: 'Your bracket was narrower than the channel',
				text: wide
					? `The order asks for the power in ${formatFrequency(asked)}. You added up ${formatFrequency(used)}, and the neighbour’s power is in your number too.`
					: `The order asks for the power in ${formatFrequency(asked)}. You added up ${formatFrequency(used)}, and the rest of the signal lies outside it.`,
				sum: `${figure(held, 1)} dBm in ${formatFrequency(used)}, ${figure(question.truth, 1)} dBm in ${formatFrequency(asked)}: ${figure(Math.abs(held - question.truth), 1)} dB ${wide ? 'too much' : 'missing'}`,
				part: wide
					? `what lies outside the ${formatFrequency(asked)}`
					: `what ${formatFrequency(used)} doesn’t hold`,
				bad: {
					at: 'reading',
					text: `Here: ${formatFrequency(used)}, the order says ${formatFrequency(asked)}`
				}
			};
		},
		make: (steps, { question }) =>
			withReading(steps, question.id, { kind: 'channel-power', centreHz: question.frequencyHz, widthHz })
	})
);
