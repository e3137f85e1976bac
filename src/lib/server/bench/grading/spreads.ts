/** How exact things are in a question's own unit: what theory leaves open, what copying a number off a reading rounds away. */
import type { SetUp } from './mistake';
import type { NumberQuestion } from '../exercise/drawn-exercise';

type Asked = Pick<NumberQuestion, 'unit' | 'digits' | 'tolerance' | 'truth'>;

const inDecibels = ({ unit }: Asked): boolean => unit.startsWith('dB');
/** Half of the last digit asked for. */
const halfDigit = ({ digits }: Asked): number => 0.5 * 10 ** -digits;
/** People type three significant digits of what isn't in decibels: wrong by at most half of the third, 0.5 %. */
const THREE_DIGITS = 0.005;

/**
 * Least standard deviation of a prediction: drifts of a reading that theory doesn't follow. 0.1 dB, or a tenth of the
 * tolerance of what isn't in decibels.
 */
export const modelSpread = (question: Asked): number =>
	inDecibels(question) ? 0.1 : Math.max(halfDigit(question), question.tolerance / 10);

/**
 * Standard deviation of what a trace's points leave open, Hz: a marker stands up to half a step beside its place, either
 * end of a distance does. 0 for anything but a frequency, and for a count.
 */
export function pointsSpread(
	{ quantity, unit }: Pick<NumberQuestion, 'quantity' | 'unit'>,
	{ resolved }: SetUp
): number {
	if (unit !== 'Hz' || quantity.kind === 'count') return 0;
	const stepHz = resolved.spanHz / (resolved.points - 1);
	return stepHz / Math.sqrt(quantity.kind === 'delta' ? 6 : 12);
}

/** Standard deviation of a number copied off a reading about that reading: its rounding. */
export function copyingSpread(question: Asked): number {
	if (inDecibels(question)) return Math.hypot(0.1, halfDigit(question));
	return Math.hypot(halfDigit(question), Math.min(question.tolerance / 6, 0.4 * typedDigit(question)));
}

/** How far an answer may be from the reading it is said to be: rounding to a whole decibel, or to three significant digits. */
export function copyingReach(question: Asked): number {
	if (inDecibels(question)) return 0.55;
	return 1.1 * Math.max(halfDigit(question), Math.min(question.tolerance / 2, typedDigit(question)));
}

/** Less than this is not worth a step of its own on the way from an answer to the truth. */
export const worthAStep = (question: Asked): number =>
	inDecibels(question) ? 0.05 : Math.max(halfDigit(question), question.tolerance / 20);

/** Half of the third significant digit, at most. */
const typedDigit = ({ truth }: Asked): number => THREE_DIGITS * Math.abs(truth);

/** Decimals of the question's unit worth showing: those asked, and of hertz and seconds none that the tolerance swallows (below 0: tens, hundreds). */
export function shownDigits(question: Asked): number {
	const { unit, digits, tolerance } = question;
	if (unit !== 'Hz' && unit !== 's') return digits;
	return Math.min(digits, 0 - Math.floor(Math.log10(tolerance / 10) + 1e-9));
}
