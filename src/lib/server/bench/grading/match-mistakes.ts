import type { Evidence } from './evidence';
import { explanations, type Candidate } from './explanations';
import type { Watched } from './watched-mistakes';

/** How many of its spreads an answer may lie from what a mistake gives, and still be it. */
const REACH = 3;

/**
 * The mistakes that an answer comes from, or null when none of those watched gives it.
 * The log rules in and out; then one mistake before two, and the likeliest: near within its own spread, and not merely vague.
 */
export function matchMistakes(watched: readonly Watched[], evidence: Evidence): Candidate | null {
	const { answer } = evidence;
	if (!answer) return null;
	const distance = ({ value, spread }: Candidate) => Math.abs(answer.value - value) / spread;
	const fits = explanations(watched, evidence).filter((candidate) => distance(candidate) <= REACH);
	// −ln of the normal likelihood: an explanation that would fit almost any number must not win by its width
	const unlikeliness = (candidate: Candidate) => distance(candidate) ** 2 / 2 + Math.log(candidate.spread);
	for (const count of [1, 2]) {
		const some = fits.filter((candidate) => candidate.watched.length === count);
		if (some.length > 0)
			return some.reduce((best, next) => (unlikeliness(next) < unlikeliness(best) ? next : best));
	}
	return null;
}
