import { powerRatioToDb } from '$lib/units/decibel';
import { z } from 'zod';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { averagesDecibels, bandSpreadDb, LOG_AVERAGE_DB, NOISE_BANDWIDTH } from '../noise-law';
import { askedWidthHz } from '../scene-power';
import { withSettings } from '../spoil';
import { modelSpread } from '../spreads';

const RBW_FOR_NOISE_DB = powerRatioToDb(NOISE_BANDWIDTH);
/**
 * A density from a trace averaged in decibels: read over a band, low by 2.51 dB; or from a marker divided by the
 * resolution bandwidth, low by 2.51 dB less 0.27 for the noise bandwidth.
 */
export const logDensity = defineMistake('log-density', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'averaged in dB',
	phrase: 'averaged decibels',
	families: ['point', 'density'],
	// A noise-density reading allows for the scale itself.
	shows: ({ setUp, request }) => averagesDecibels(setUp) && request.kind !== 'noise-density',
	fromReading: ({ planeValue, setUp, family }) =>
		family === 'point' ? planeValue - powerRatioToDb(setUp.resolved.rbwHz) : planeValue,
	predict: (context, setUp) =>
		averagesDecibels(setUp)
			? {
					value: context.question.truth - LOG_AVERAGE_DB,
					spread: Math.hypot(
						modelSpread(context.question),
						bandSpreadDb(setUp, askedWidthHz(context.question) ?? 0)
					)
				}
			: null,
	explain({ setUp, source, change, yours, drawn, question }) {
		const rbwHz = setUp?.resolved.rbwHz ?? drawn.profile.rbwHz[0];
		const byMarker = source?.family === 'point';
		const lowDb = byMarker ? LOG_AVERAGE_DB - RBW_FOR_NOISE_DB : LOG_AVERAGE_DB;
		const bandwidth = `Dividing by the filter’s ${shortFigure(rbwHz)} Hz instead of its noise bandwidth of ${figure(NOISE_BANDWIDTH * rbwHz, 1)} Hz gives 0.27 dB back.`;
		return {
			title: 'The mean of decibels is not the mean power',
			text: `Your trace averaged decibels, and the mean of noise in decibels stands 2.51 dB under its mean power. ${byMarker ? bandwidth : 'Averages on power read right.'}`,
			sum: `${figure(yours, question.digits)} + 2.51${byMarker ? ' − 0.27' : ''} = ${figure(yours + lowDb, question.digits)} ${question.unit}`,
			note:
				Math.abs(change - lowDb) < 0.05
					? undefined
					: `with noise and the receiver’s own error, ${figure(change, 1)} dB`,
			part: 'lost to averaging decibels',
			bad: { at: 'set-up', text: 'Here: averages on decibels; set Averages to power' }
		};
	},
	make: (steps) => withSettings(steps, { scale: 'log' })
}));
