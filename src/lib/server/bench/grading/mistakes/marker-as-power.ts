import { powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { quantityFrequencyHz } from '$lib/server/bench/exercise/quantity-frequency';
import { defineMistake, type Context } from '../mistake';
import { averagesDecibels, LOG_AVERAGE_DB, NOISE_BANDWIDTH, pointSpreadDb } from '../noise-law';
import { placeHz } from '../place';
import { askedWidthHz, densityDbmPerHz, flatWidthHz } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

const widthOf = ({ question }: Context): number => askedWidthHz(question) as number;
const COUNTS = [
	'no',
	'one',
	'two',
	'three',
	'four',
	'five',
	'six',
	'seven',
	'eight',
	'nine',
	'ten',
	'eleven',
	'twelve'
];
const inWords = (count: number): string => COUNTS[count] ?? shortFigure(count, 0);

/** The highest point of a spread signal read as its power: one filter's share of it. */
export const markerAsPower = defineMistake('marker-as-power', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'one point',
	phrase: 'read one point of the hump',
	families: ['point'],
	shows: ({ request, reading }, { question }) => {
		const atHz = placeHz(reading) ?? quantityFrequencyHz(request);
		return Math.abs(atHz - question.frequencyHz) <= (askedWidthHz(question) as number) / 2;
	},
	predict(context, setUp) {
		const { rbwHz } = setUp.resolved;
		const averagedLog = averagesDecibels(setUp) ? LOG_AVERAGE_DB : 0;
		const value = densityDbmPerHz(context, rbwHz) + powerRatioToDb(NOISE_BANDWIDTH * rbwHz) - averagedLog;
		return { value, spread: Math.hypot(modelSpread(context.question), pointSpreadDb(setUp)) };
	},
	explain({ change, setUp, ...context }) {
		const rbwHz = setUp?.resolved.rbwHz ?? context.drawn.profile.rbwHz[0];
		const noiseWidthHz = NOISE_BANDWIDTH * rbwHz;
		const spreadHz = flatWidthHz(context, widthOf(context));
		const missedDb = powerRatioToDb(spreadHz / noiseWidthHz);
		const restDb = missedDb - change;
		const filters = Math.round(spreadHz / noiseWidthHz);
		return {
			title: 'A point is not a power',
			text: `A marker says how much falls into your ${formatFrequency(rbwHz)} filter at one frequency; to noise that filter is ${figure(noiseWidthHz, 1)} Hz wide, its noise bandwidth. This signal is spread over ${formatFrequency(Math.round(spreadHz / 100) * 100)}, ${inWords(filters)} filters wide, so the marker misses most of it.`,
			sum: `10 log (${figure(spreadHz, 0)}/${figure(noiseWidthHz, 1)}) = ${figure(missedDb, 1)} dB`,
			note:
				Math.abs(restDb) < 0.05
					? undefined
					: `${restDb > 0 ? 'less' : 'and'} ${figure(Math.abs(restDb), 1)} dB of statistical scatter and the receiver’s own error`,
			part: `the rest of the signal, which the marker’s ${formatFrequency(rbwHz)} doesn’t hold`,
			bad: { at: 'reading', text: 'Here: the order asks for a channel, so take channel power' }
		};
	},
	make: (steps, { question }) =>
		withReading(steps, question.id, { kind: 'marker', atHz: question.frequencyHz })
}));
