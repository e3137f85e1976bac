import { quantityText } from '../exercise/quantity-text';
import type { Judgement } from './judge-question';
import { shownDigits } from './spreads';

const joined = (phrases: readonly string[]): string =>
	phrases.length < 2 ? phrases.join('') : `${phrases.slice(0, -1).join(', ')}, and ${phrases.at(-1)}`;

/** The finding in one sentence: "You read one point of the hump, and left the lead out." */
export function questionTitle({ verdict, matched, difference, evidence, remarks }: Judgement): string {
	const { question } = evidence;
	const phrases = joined(matched?.watched.map(({ mistake }) => mistake.phrase) ?? []);
	switch (verdict) {
		case 'unanswered':
			return 'You gave no answer.';
		case 'right':
			return 'Right, and by a method that can support it.';
		case 'right-but-method':
			if (phrases) return `The number is right, but you ${phrases}.`;
			if (remarks.some(({ code }) => code === 'between-markers'))
				return 'The number is right, worked out between two markers.';
			return `The number is right, but its evidence is not. ${remarks.at(-1)?.text ?? ''}`.trim();
		case 'wrong': {
			if (phrases) return `You ${phrases}.`;
			const unit = question.unit.startsWith('dB') ? 'dB' : question.unit;
			const off = quantityText(Math.abs(difference ?? 0), unit, shownDigits(question));
			return `Your number is ${off} too ${(difference ?? 0) < 0 ? 'low' : 'high'}, and none of the usual mistakes gives it.`;
		}
	}
}
