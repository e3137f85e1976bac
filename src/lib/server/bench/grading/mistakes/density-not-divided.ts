import { powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { widthHzOf } from '../read-width';
import { channelDbm, flatWidthHz } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

/** The power of the whole channel given as a density: never divided by a bandwidth. */
export const densityNotDivided = defineMistake(
	'density-not-divided',
	z.strictObject({ widthHz: z.number().positive() }),
	({ widthHz }) => ({
		stage: 'reading',
		label: 'whole power',
		phrase: 'gave the whole power as a density',
		families: ['band'],
		shows: () => true,
		predict: (context) => ({
			value: channelDbm(context, context.question.frequencyHz, widthHz),
			spread: modelSpread(context.question)
		}),
		explain({ source, yours, drawn, question }) {
			const used = (source && widthHzOf(source.request)) ?? widthHz;
			const flatHz = flatWidthHz({ drawn, question }, used);
			const dividedDb = powerRatioToDb(flatHz);
			return {
				title: 'A density is a power per hertz',
				text: `You gave the power of ${formatFrequency(used)} where the order asks for the power in each hertz at the middle. This signal is as strong as one that is flat over ${formatFrequency(Math.round(flatHz / 100) * 100)}.`,
				sum: `${figure(yours, 1)} − 10 log (${figure(flatHz, 0)}) = ${figure(yours - dividedDb, 1)} dBm/Hz`,
				part: 'not divided by the width it is spread over',
				bad: { at: 'answer', text: 'Here: dBm is not dBm/Hz; read a density' }
			};
		},
		make: (steps, { question }) =>
			withReading(steps, question.id, { kind: 'channel-power', centreHz: question.frequencyHz, widthHz })
	})
);
