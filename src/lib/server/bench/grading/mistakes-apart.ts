import { numberQuestions, type DrawnExercise } from '../exercise/drawn-exercise';
import type { Prediction } from './mistake';
import { predictMistake } from './predict-mistake';
import { watchedMistakes } from './watched-mistakes';

/** How many spreads must lie between the outcomes of two mistakes. */
export const SPREADS_APART = 4;
/** A draw needs a little more, because what is made on the bench scatters about what theory says. */
const DRAWN_APART = 6;
/** Distance between two numbers, in the standard deviation of their difference. */
export const spreadsBetween = (a: Prediction, b: Prediction): number =>
	Math.abs(a.value - b.value) / Math.hypot(a.spread, b.spread);

/** Whether the mistakes watched on each question would report numbers that can be told apart. */
export const mistakesApart = (drawn: DrawnExercise): boolean =>
	numberQuestions(drawn).every((question) => {
		const outcomes = watchedMistakes(question)
			.map((watched) => predictMistake(watched, { drawn, question }))
			.filter((outcome) => outcome !== null);
		return outcomes.every((a, i) => outcomes.slice(i + 1).every((b) => spreadsBetween(a, b) >= DRAWN_APART));
	});
