import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context } from '../mistake';
import { lineDbm } from '../other-carrier';
import { withSum } from '../spoil';

/** How far the tones stand over their third-order product at the reference plane, dB, and the tones' level. */
function tonesAndProduct(context: Context): { toneDbm: number; differenceDb: number } {
	const { quantity } = context.question;
	if (quantity.kind !== 'intercept') return { toneDbm: 0, differenceDb: 0 };
	const [lower, upper] = [quantity.lowerHz, quantity.upperHz].map((hz) => lineDbm(context, hz));
	const productDbm = lineDbm(context, 2 * quantity.lowerHz - quantity.upperHz);
	return {
		toneDbm: (lower + upper) / 2,
		differenceDb: (2 * lower + upper - productDbm) / 2 - (lower + upper) / 2
	};
}

/** An intercept put the whole difference between tones and product over the tones, and not half of it. */
export const differenceNotHalved = defineMistake('difference-not-halved', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'whole difference',
	phrase: 'added the whole difference, not half of it',
	change: (context) => tonesAndProduct(context).differenceDb,
	explain({ yours, change, ...context }) {
		const { question } = context;
		const { toneDbm } = tonesAndProduct(context);
		const half = Math.abs(change);
		return {
			title: 'Half the difference, over the tones',
			text: 'Third-order products rise 3 dB for each decibel of the tones, so they close in by 2 dB. To the intercept, where the two would meet, it is half of the difference that you read.',
			sum: `${figure(toneDbm, 1)} + ${figure(2 * half, 1)}/2 = ${figure(toneDbm + half, question.digits)} dBm; you gave ${figure(yours, question.digits)} dBm`,
			part: 'the other half of the difference',
			bad: { at: 'answer', text: 'Here: the whole difference over the tones; half of it is right' }
		};
	},
	make(steps, context) {
		const { differenceDb } = tonesAndProduct(context);
		return withSum(steps, context.question.id, (value) => value + differenceDb);
	}
}));
