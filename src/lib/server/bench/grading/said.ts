import { quantityText } from '../exercise/quantity-text';
import type { NumberQuestion } from '../exercise/drawn-exercise';
import { shownDigits } from './spreads';

/** A number in a question's own unit, as its explanations say it: "−47.2 dBm", "12.35 kHz". */
export const said = (value: number, question: NumberQuestion): string =>
	quantityText(value, question.unit, shownDigits(question));
