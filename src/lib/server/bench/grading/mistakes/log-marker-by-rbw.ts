import { powerRatioToDb } from '$lib/units/decibel';
import { z } from 'zod';
import { figure, shortFigure } from '../../exercise/figure';
import { MODEL_SPREAD_DB, defineMistake } from '../mistake';
import { LOG_AVERAGE_DB, NOISE_BANDWIDTH, pointSpreadDb } from '../noise-law';
import { densityDbmPerHz } from '../scene-power';
import { setUpOf } from '../set-up-of';
import { withReading, withSettings } from '../spoil';

const RBW_FOR_NOISE_DB = powerRatioToDb(NOISE_BANDWIDTH);
/** Rows that bring one point of a log average to within 0.35 dB: as a careful person making this mistake would take. */
const CAREFUL_ROWS = 250;

/** A marker on a trace averaged in decibels, brought to 1 Hz by its resolution bandwidth: low by 2.51 dB, less 0.27. */
export const logMarkerByRbw = defineMistake('log-marker-by-rbw', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'dB average by RBW',
	phrase: 'divided an average of decibels by the resolution bandwidth',
	families: ['point'],
	shows: ({ setUp }) => setUp.resolved.scale === 'log',
	fromReading: ({ planeValue, setUp }) => planeValue - powerRatioToDb(setUp.resolved.rbwHz),
	predict: (context, setUp) =>
		setUp.resolved.scale !== 'log'
			? null
			: {
					value: densityDbmPerHz(context, setUp.resolved.rbwHz) - LOG_AVERAGE_DB + RBW_FOR_NOISE_DB,
					spread: Math.hypot(MODEL_SPREAD_DB, pointSpreadDb(setUp))
				},
	explain({ setUp, change, drawn }) {
		const rbwHz = setUp?.resolved.rbwHz ?? drawn.profile.rbwHz[0];
		return {
			title: 'Decibels averaged, and the wrong bandwidth taken off',
			text: `An average of decibels reads noise 2.51 dB low, and your filter’s noise bandwidth is ${figure(NOISE_BANDWIDTH * rbwHz, 1)} Hz, not its ${shortFigure(rbwHz)} Hz. A density reading allows for both.`,
			sum: `2.51 − 0.27 = ${figure(LOG_AVERAGE_DB - RBW_FOR_NOISE_DB, 2)} dB low`,
			note:
				Math.abs(change - LOG_AVERAGE_DB + RBW_FOR_NOISE_DB) < 0.05
					? undefined
					: `yours: ${figure(change, 1)} dB`,
			part: 'lost to averaging decibels, less the noise bandwidth',
			bad: { at: 'set-up', text: 'Here: averages on decibels; set Averages to power, or read a density' }
		};
	},
	make(steps, context) {
		const { question, drawn } = context;
		const { rbwHz } = setUpOf(drawn, steps, question.id).resolved;
		const careful = withSettings(steps, {
			scale: 'log',
			traces: [{ mode: 'average', count: CAREFUL_ROWS }]
		}).map((step) => (step.do === 'sweep' ? { ...step, sweeps: CAREFUL_ROWS } : step));
		return withReading(
			careful,
			question.id,
			{ kind: 'marker', atHz: question.frequencyHz },
			(value) => value - powerRatioToDb(rbwHz)
		);
	}
}));
