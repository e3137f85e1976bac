import { z } from 'zod';
import { dbmToMilliwatts, powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import type { Scope } from '$lib/server/bench/exercise/expression';
import { SWEPT_RBW_HZ } from '$lib/server/bench/exercise/swept-rbw';
import type { FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import { defineMistake, type Context, type SetUp } from '../mistake';
import { noiseMw } from '../noise-in-reading';
import { averagesDecibels, LOG_AVERAGE_DB, NOISE_BANDWIDTH, pointSpreadDb } from '../noise-law';
import { withSettings } from '../spoil';
import { modelSpread } from '../spreads';

const BANDWIDTH_DB = powerRatioToDb(NOISE_BANDWIDTH);
const LOW_DB = LOG_AVERAGE_DB - BANDWIDTH_DB;

/** Chance of one point, grown by what is taken off it. */
function spreadDb(context: Context, setUp: SetUp): number {
	const share = context.question.noiseTakenOff
		? noiseMw(context, setUp) / dbmToMilliwatts(context.question.truth)
		: 0;
	return Math.hypot(modelSpread(context.question), pointSpreadDb(setUp) * Math.hypot(1 + share, share));
}

/** Every noise density of a method read with a marker instead, and divided by the resolution it was swept with. */
function byMarker(steps: readonly FilledStep[]): FilledStep[] {
	const names = new Set<string>();
	return steps.map((step) => {
		if (step.do === 'read' && step.reading.kind === 'noise-density') {
			names.add(step.as);
			return { ...step, reading: { kind: 'marker', atHz: step.reading.atHz } };
		}
		if (step.do !== 'answer' || !('value' in step)) return step;
		const perHertz = (scope: Scope): Scope => {
			const rbwDb = powerRatioToDb(scope[SWEPT_RBW_HZ] as number);
			const divided = (name: string, value: Scope[string]) =>
				names.has(name) ? (value as number) - rbwDb : value;
			return Object.fromEntries(Object.entries(scope).map(([name, value]) => [name, divided(name, value)]));
		};
		return { ...step, value: (scope: Scope) => step.value(perHertz(scope)) };
	});
}

/** A density made from a marker on a trace averaged in decibels, divided by the resolution and not by the noise bandwidth: 2.24 dB low. */
export const markerOverResolution = defineMistake('marker-over-resolution', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'marker by resolution',
	phrase: 'divided a marker by the resolution',
	families: ['point'],
	shows: ({ setUp }) => averagesDecibels(setUp),
	fromReading: ({ cleanValue, setUp }) => cleanValue - powerRatioToDb(setUp.resolved.rbwHz),
	predict: (context, setUp) =>
		averagesDecibels(setUp)
			? { value: context.question.truth - LOW_DB, spread: spreadDb(context, setUp) }
			: null,
	explain({ setUp, yours, change, drawn, question }) {
		const rbwHz = setUp?.resolved.rbwHz ?? drawn.profile.rbwHz[0];
		return {
			title: 'A marker knows nothing of noise',
			text: `Your trace averaged decibels, and the mean of noise in decibels stands 2.51 dB under its mean power. Its filter of ${formatFrequency(rbwHz)} lets in the noise of ${shortFigure(NOISE_BANDWIDTH * rbwHz, 0)} Hz, which gives 0.27 dB back. The noise density reading allows for both.`,
			sum: `${figure(yours, question.digits)} + 2.51 − 0.27 = ${figure(yours + LOW_DB, question.digits)} ${question.unit}`,
			note:
				Math.abs(change - LOW_DB) < 0.05
					? undefined
					: `with chance and the receiver’s own error, ${figure(change, 1)} dB`,
			part: 'averaged decibels, divided by the resolution',
			bad: { at: 'reading', text: 'Here: a marker on noise; take the noise density' }
		};
	},
	make: (steps) => byMarker(withSettings(steps, { scale: 'log' }))
}));
