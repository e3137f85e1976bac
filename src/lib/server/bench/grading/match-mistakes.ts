import type { Evidence } from './evidence';
import { explanations, type Candidate } from './explanations';
import type { Watched } from './watched-mistakes';

/** How many of its spreads an answer may lie from what a mistake gives, and still be it. */
const REACH = 3;

/**
 * The mistakes that an answer comes from, or null when none of those watched gives it.
 * The log rules in and out; then one mistake before two, and the nearest within its own spread.
 */
export function matchMistakes(watched: readonly Watched[], evidence: Evidence): Candidate | null {
	const { answer } = evidence;
	if (!answer) return null;
	const distance = ({ value, spread }: Candidate) => Math.abs(answer.value - value) / spread;
	const fits = explanations(watched, evidence).filter((candidate) => distance(candidate) <= REACH);
	for (const count of [1, 2]) {
		const some = fits.filter((candidate) => candidate.watched.length === count);
		if (some.length > 0) return some.reduce((best, next) => (distance(next) < distance(best) ? next : best));
	}
	return null;
}
