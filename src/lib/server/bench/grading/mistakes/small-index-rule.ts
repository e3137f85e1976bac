import { z } from 'zod';
import { figure } from '$lib/server/bench/exercise/figure';
import { besselOrders } from '$lib/measure/bessel';
import type { Source } from '../evidence';
import { defineMistake } from '../mistake';
import { toneOf, toneReadHz } from '../modulation';
import { said } from '../said';
import { modelSpread } from '../spreads';
import { withReading } from '../spoil';

/** Deviation that the first pair would mean if the index were small: β ≈ 2·J₁/J₀. */
const fromFirstPairHz = (index: number, modulatingHz: number): number => {
	const [carrier, first] = besselOrders(1, index);
	return 2 * Math.abs(first / carrier) * modulatingHz;
};

/** A deviation from carrier and first sidebands alone, by the rule that holds for a small index only. */
export const smallIndexRule = defineMistake('small-index-rule', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'first pair alone',
	phrase: 'used the rule for a small index',
	families: ['am-depth'],
	shows: () => true,
	fromReading: (source: Source) => (source.reading.value / 100) * (toneReadHz(source) ?? 0),
	predict(context) {
		const { index, modulatingHz } = toneOf(context);
		return { value: fromFirstPairHz(index, modulatingHz), spread: 2 * modelSpread(context.question) };
	},
	explain({ yours, source, ...context }) {
		const { question } = context;
		const { index, modulatingHz } = toneOf(context);
		const usedHz = (source && toneReadHz(source)) ?? modulatingHz;
		return {
			title: 'That rule is for a small index',
			text: `Carrier and first sidebands alone give the index only while it is well under 1: then the sidebands hold half of it each, and the carrier stays what it was. Here the index is ${figure(index, 2)}; the carrier has lost power to the sidebands, and a second pair stands out. All lines together, through the Bessel functions, give the deviation.`,
			sum: `first pair alone: ${figure(yours / usedHz, 2)} × ${figure(usedHz, 0)} Hz = ${said(yours, question)}; all lines: ${figure(index, 2)} × ${figure(modulatingHz, 0)} Hz = ${said(question.truth, question)}`,
			part: 'from the small-index rule to the Bessel functions',
			bad: { at: 'reading', text: 'Here: carrier and first pair only; use all the lines' }
		};
	},
	make(steps, context) {
		const { quantity, id } = context.question;
		const carrierHz = 'carrierHz' in quantity ? quantity.carrierHz : 0;
		const { modulatingHz } = toneOf(context);
		return withReading(
			steps,
			id,
			{ kind: 'am-depth', carrierHz },
			(percent) => (percent / 100) * modulatingHz
		);
	}
}));
