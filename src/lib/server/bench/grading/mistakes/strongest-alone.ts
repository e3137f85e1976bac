import { z } from 'zod';
import type { BenchReading } from '$lib/server/bench/exercise/attempt-record';
import { figure } from '$lib/server/bench/exercise/figure';
import { harmonicsOf } from '../harmonic-parts';
import { defineMistake } from '../mistake';
import { said } from '../said';
import { withReading } from '../spoil';

/** How far a receiver's error at a harmonic differs from that at the fundamental: 0.26 dB, as a share of voltage. */
const UNEVEN = 0.03;

const percentOf = (dbc: number): number => 100 * 10 ** (dbc / 20);
const strongest = (harmonics: readonly { dbc: number }[]): number =>
	Math.max(...harmonics.map(({ dbc }) => dbc));

/** Distortion worked out from the strongest harmonic alone. */
export const strongestAlone = defineMistake('strongest-alone', z.strictObject({}), () => ({
	stage: 'reading',
	label: 'strongest alone',
	phrase: 'counted the strongest harmonic alone',
	families: ['harmonics'],
	shows: () => true,
	fromReading: ({ reading }: { reading: BenchReading }) => percentOf(reading.value),
	predict: (context) => ({
		value: percentOf(strongest(harmonicsOf(context))),
		spread: UNEVEN * context.question.truth
	}),
	explain({ yours, source, ...context }) {
		const { question } = context;
		const levels = harmonicsOf(context, source).map(({ dbc }) => `10^(${figure(dbc, 1)}/10)`);
		return {
			title: 'All of them together',
			text: 'Total harmonic distortion counts every harmonic: their powers are added, and the root of the sum is taken. You gave the strongest one’s share alone.',
			sum: `the strongest alone ${said(yours, question)}; all of them 100 · √(${levels.join(' + ')})`,
			part: 'the other harmonics, left out',
			bad: { at: 'answer', text: 'Here: one harmonic; the order asks for all of them' }
		};
	},
	make(steps, { question }) {
		const { quantity } = question;
		if (quantity.kind !== 'thd') return [...steps];
		const { fundamentalHz, count } = quantity;
		return withReading(steps, question.id, { kind: 'harmonics', fundamentalHz, count }, percentOf);
	}
}));
