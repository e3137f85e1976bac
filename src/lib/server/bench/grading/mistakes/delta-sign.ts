import { z } from 'zod';
import { defineMistake } from '../mistake';
import { said } from '../said';
import { withSum } from '../spoil';
import { modelSpread } from '../spreads';

/** A difference told the wrong way about. */
export const deltaSign = defineMistake('delta-sign', z.strictObject({}), () => ({
	stage: 'slip',
	label: 'other way about',
	phrase: 'told the difference the wrong way about',
	change: ({ question }) => -2 * question.truth,
	given: (value) => -value,
	// of two lines' levels, each strays by itself
	spread: ({ question }) => (question.unit === 'dB' ? 1.5 * modelSpread(question) : 0),
	explain: ({ question, yours }) => ({
		title: 'A difference goes from one to the other',
		text: 'From the stronger to the weaker the level falls: minus. Set the reference marker on the carrier that the order compares with, the second one on what it asks about, and take the sign as it comes.',
		sum: `${said(yours, question)} is from there to here; from here to there ${said(-yours, question)}`,
		part: 'the difference taken the other way about',
		bad: { at: 'answer', text: 'Here: the sign of the difference' }
	}),
	make: (steps, { question }) => withSum(steps, question.id, (value) => -value)
}));
