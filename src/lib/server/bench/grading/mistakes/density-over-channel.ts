import { powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { sameWidth, widthHzOf } from '../read-width';
import { channelDbm } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

/** The channel's power divided by the channel's width where the density in its middle is asked: the empty edges count too. */
export const densityOverChannel = defineMistake(
	'density-over-channel',
	z.strictObject({ widthHz: z.number().positive() }),
	({ widthHz }) => ({
		stage: 'reading',
		label: 'spread over the channel',
		phrase: 'spread the power over the whole channel',
		families: ['band', 'density'],
		shows({ request, family }) {
			const width = widthHzOf(request);
			return width !== undefined && (family === 'band' || sameWidth(width, widthHz));
		},
		fromReading: ({ planeValue, family, request }) =>
			family === 'band' ? planeValue - powerRatioToDb(widthHzOf(request) as number) : planeValue,
		predict: (context) => ({
			value: channelDbm(context, context.question.frequencyHz, widthHz) - powerRatioToDb(widthHz),
			spread: modelSpread(context.question)
		}),
		explain({ question, drawn }) {
			const power = channelDbm({ question, drawn }, question.frequencyHz, widthHz);
			return {
				title: 'The channel is not filled to its edges',
				text: `You divided by the ${formatFrequency(widthHz)} of the channel. The signal fills only part of that, so in the middle there is more in each hertz than the mean over the channel.`,
				sum: `${figure(power, 1)} − 10 log (${figure(widthHz, 0)}) = ${figure(power - powerRatioToDb(widthHz), 1)} dBm/Hz, the middle has ${figure(question.truth, 1)}`,
				part: 'the channel’s empty edges',
				bad: { at: 'answer', text: 'Here: the order asks for the middle of the channel' }
			};
		},
		make: (steps, { question }) =>
			withReading(
				steps,
				question.id,
				{ kind: 'channel-power', centreHz: question.frequencyHz, widthHz },
				(value) => value - powerRatioToDb(widthHz)
			)
	})
);
