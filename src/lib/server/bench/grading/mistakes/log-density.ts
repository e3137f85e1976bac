import { powerRatioToDb } from '$lib/units/decibel';
import { z } from 'zod';
import { figure, shortFigure } from '../../exercise/figure';
import { MODEL_SPREAD_DB, defineMistake } from '../mistake';
import { averagesDecibels, LOG_AVERAGE_DB, NOISE_BANDWIDTH, pointSpreadDb } from '../noise-law';
import { densityDbmPerHz } from '../scene-power';
import { setUpOf } from '../set-up-of';
import { withReading, withSettings } from '../spoil';

const RBW_FOR_NOISE_DB = powerRatioToDb(NOISE_BANDWIDTH);
/** Rows that bring one point of a log average to within 0.3 dB: as a careful person making this mistake would take. */
const CAREFUL_ROWS = 160;

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
					value: densityDbmPerHz(context, setUp.resolved.rbwHz) - LOG_AVERAGE_DB + RBW_FOR_NOISE_DB,
					spread: Math.hypot(MODEL_SPREAD_DB, pointSpreadDb(setUp))
				}
			: null,
	explain({ setUp, source, change, drawn }) {
		const rbwHz = setUp?.resolved.rbwHz ?? drawn.profile.rbwHz[0];
		const byMarker = source === undefined || source.family === 'point';
		const lowDb = byMarker ? LOG_AVERAGE_DB - RBW_FOR_NOISE_DB : LOG_AVERAGE_DB;
		const bandwidth = `Dividing by the filter’s ${shortFigure(rbwHz)} Hz instead of its noise bandwidth of ${figure(NOISE_BANDWIDTH * rbwHz, 1)} Hz gives 0.27 dB back.`;
		return {
			title: 'The mean of decibels is not the mean power',
			text: `Your trace averaged decibels, and the mean of noise in decibels stands 2.51 dB under its mean power. ${byMarker ? bandwidth : 'Averages on power read right.'}`,
			sum: byMarker ? `2.51 − 0.27 = ${figure(lowDb, 2)} dB low` : '10 × 0.5772/2.3026 = 2.51 dB',
			note: Math.abs(change - lowDb) < 0.05 ? undefined : `yours: ${figure(change, 1)} dB`,
			part: 'lost to averaging decibels',
			bad: { at: 'set-up', text: 'Here: averages on decibels; set Averages to power' }
		};
	},
	make(steps, { question, drawn }) {
		const { rbwHz } = setUpOf(drawn, steps, question.id).resolved;
		const careful = withSettings(steps, { scale: 'log', traces: [{ mode: 'average', count: CAREFUL_ROWS }] });
		const swept = careful.map((step) => (step.do === 'sweep' ? { ...step, sweeps: CAREFUL_ROWS } : step));
		const marker = { kind: 'marker', atHz: question.frequencyHz } as const;
		return withReading(swept, question.id, marker, (value) => value - powerRatioToDb(rbwHz));
	}
}));
