import { powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake } from '../mistake';
import { NOISE_BANDWIDTH, pointSpreadDb } from '../noise-law';
import { densityDbmPerHz } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

/** A marker's level given as a density: the power in one resolution bandwidth, not in one hertz. */
export const markerNotDivided = defineMistake('marker-not-divided', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'marker as it reads',
	phrase: 'gave a marker’s level as a density',
	families: ['point'],
	shows: () => true,
	predict: (context, setUp) => ({
		value:
			densityDbmPerHz(context, setUp.resolved.rbwHz) + powerRatioToDb(NOISE_BANDWIDTH * setUp.resolved.rbwHz),
		spread: Math.hypot(modelSpread(context.question), pointSpreadDb(setUp))
	}),
	explain({ setUp, yours, drawn }) {
		const rbwHz = setUp?.resolved.rbwHz ?? drawn.profile.rbwHz[0];
		const noiseWidthHz = NOISE_BANDWIDTH * rbwHz;
		return {
			title: 'A marker reads a bandwidth, not a hertz',
			text: `The marker shows what falls into your ${formatFrequency(rbwHz)} filter, whose noise bandwidth, the width of a flat filter that passes as much noise, is ${figure(noiseWidthHz, 1)} Hz. For one hertz, take that many off.`,
			sum: `${figure(yours, 1)} − 10 log (${figure(noiseWidthHz, 1)}) = ${figure(yours - powerRatioToDb(noiseWidthHz), 1)} dBm/Hz`,
			part: 'not divided by the noise bandwidth',
			bad: { at: 'answer', text: 'Here: dBm is not dBm/Hz; read a density' }
		};
	},
	make: (steps, { question }) =>
		withReading(steps, question.id, { kind: 'marker', atHz: question.frequencyHz })
}));
