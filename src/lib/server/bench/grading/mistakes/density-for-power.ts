import { powerRatioToDb } from '$lib/units/decibel';
import { formatFrequency } from '$lib/units/format-quantity';
import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context } from '../mistake';
import { askedWidthHz, densityDbmPerHz } from '../scene-power';
import { withReading } from '../spoil';
import { modelSpread } from '../spreads';

const askedOf = ({ question }: Context): number => askedWidthHz(question) as number;

/** The power of one hertz given where that of a reference width is asked: never multiplied up by the width. */
export const densityForPower = defineMistake('density-for-power', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'one hertz of it',
	phrase: 'gave the power of one hertz',
	families: ['density'],
	shows: () => true,
	predict: (context) => ({
		value: densityDbmPerHz(context, askedOf(context)),
		spread: modelSpread(context.question)
	}),
	explain({ question, drawn, yours }) {
		const widthHz = askedOf({ question, drawn });
		const widerDb = powerRatioToDb(widthHz);
		return {
			title: 'A limit in a stated width is not a limit per hertz',
			text: `You gave a density, the power that one hertz holds. The order asks for what ${formatFrequency(widthHz)} hold, and that is ${figure(widerDb, 1)} dB more.`,
			sum: `${figure(yours, 1)} + 10 log (${figure(widthHz, 0)}) = ${figure(yours + widerDb, 1)} dBm in ${formatFrequency(widthHz)}`,
			part: `the rest of the ${formatFrequency(widthHz)}`,
			bad: { at: 'answer', text: 'Here: dBm/Hz is not dBm; multiply up, or read the power of the width' }
		};
	},
	make: (steps, { question }) =>
		withReading(steps, question.id, {
			kind: 'power-density',
			centreHz: question.frequencyHz,
			widthHz: askedWidthHz(question) as number
		})
}));
