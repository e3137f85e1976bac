import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { defineMistake, type Context } from '../mistake';
import { said } from '../said';
import { withSum } from '../spoil';

/** How many sidebands a depth is made of; distortion is one ratio. */
const sidesOf = ({ question }: Context): number => (question.quantity.kind === 'am-depth' ? 2 : 1);

/** Decibels between two lines turned into per cent as a ratio of powers where one of voltages is asked. */
export const powerForVoltage = defineMistake('power-for-voltage', z.strictObject({}), () => {
	const given = (percent: number, context: Context) =>
		100 * sidesOf(context) * (percent / 100 / sidesOf(context)) ** 2;
	return {
		stage: 'slip',
		label: 'ratio of powers',
		phrase: 'turned decibels into a ratio of powers',
		change: (context) => given(context.question.truth, context) - context.question.truth,
		given,
		explain({ yours, ...context }) {
			const { question } = context;
			const sides = sidesOf(context);
			const right = 100 * sides * Math.sqrt(yours / 100 / sides);
			const downDb = 20 * Math.log10(right / 100 / sides);
			const times = sides === 1 ? '' : `${sides} · `;
			return {
				title: 'Per cent of voltage, not of power',
				text:
					sides === 2
						? 'Depth is a share of the carrier’s amplitude: each sideband is half of it. An amplitude follows decibels over 20; you divided them by 10.'
						: 'Distortion in per cent is a share of the fundamental’s amplitude. An amplitude follows decibels over 20; you divided them by 10.',
				sum: `${times}10^(${figure(downDb, 1)}/20) = ${said(right, question)}; ${times}10^(${figure(downDb, 1)}/10) = ${said(yours, question)}`,
				part: 'a ratio of powers, where one of voltages is asked',
				bad: { at: 'answer', text: 'Here: divide decibels by 20 for a ratio of voltages' }
			};
		},
		make: (steps, context) => withSum(steps, context.question.id, (value) => given(value, context))
	};
});
