import { formatTime } from '$lib/units/format-quantity';
import { truth } from '../truth/truth';
import type { Context } from './mistake';

/** A time to three significant digits, in words: 40.4 ms. */
export const shortTime = (timeS: number): string => formatTime(Number(timeS.toPrecision(3)));

/** How long what comes and goes stays on, and from one start to the next, s: of what a question about times asks. */
export function onAndPeriodS({ drawn, question }: Context): { onS: number; periodS: number } {
	const { value, parts } = truth(drawn.scene, question.quantity);
	return { onS: value, periodS: (parts as { periodS?: number } | undefined)?.periodS ?? value };
}
