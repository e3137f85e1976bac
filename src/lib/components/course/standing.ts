/** The state of an exercise for one person, in words and a mark: never in colour alone. */
import type { ExerciseProgress } from '$lib/schemas/course-view';
import { ordinal } from '$lib/units/ordinal';

export interface Standing {
	mark: 'dot' | 'half' | 'check' | 'cross';
	words: string;
}

export function standingOf(
	exercise: Pick<ExerciseProgress, 'standing' | 'attempts' | 'tries' | 'triesLeft'>
): Standing {
	const { attempts, triesLeft } = exercise;
	switch (exercise.standing) {
		case 'not-started':
			return { mark: 'dot', words: 'not begun' };
		case 'open':
			return { mark: 'half', words: `${ordinal(attempts.length)} attempt open` };
		case 'passed': {
			const first = attempts.find(({ passed, practice }) => passed === true && !practice);
			return { mark: 'check', words: `right at the ${ordinal(first?.number ?? 1)} attempt` };
		}
		case 'not-passed':
			return {
				mark: 'cross',
				words: `not right yet, ${triesLeft} ${triesLeft === 1 ? 'try' : 'tries'} left`
			};
	}
}
