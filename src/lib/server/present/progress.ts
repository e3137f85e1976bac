import type { AttemptLineView, ExerciseProgress } from '$lib/schemas/course-view';

interface AttemptRecord {
	id: number;
	number: number;
	startedAt: Date;
	closedAt: Date | null;
	/** As the database says it; null while the attempt is open. */
	passed: 0 | 1 | null;
}

/** An exercise with what this person has done at it. @param attempts theirs, oldest first */
export function presentProgress(
	exercise: { slug: string; title: string; number: number; tries: number },
	attempts: AttemptRecord[]
): ExerciseProgress {
	const open = attempts.find(({ closedAt }) => closedAt === null);
	return {
		slug: exercise.slug,
		title: exercise.title,
		number: exercise.number,
		tries: exercise.tries,
		triesLeft: Math.max(0, exercise.tries - attempts.length),
		standing: standingOf(attempts, open !== undefined),
		openAttemptId: open?.id ?? null,
		attempts: attempts.map(presentAttemptLine)
	};
}

function standingOf(attempts: AttemptRecord[], open: boolean): ExerciseProgress['standing'] {
	if (attempts.some(({ passed }) => passed === 1)) return 'passed';
	if (open) return 'open';
	return attempts.length === 0 ? 'not-started' : 'not-passed';
}

const presentAttemptLine = ({ id, number, startedAt, closedAt, passed }: AttemptRecord): AttemptLineView => ({
	id,
	number,
	state: closedAt ? 'closed' : 'open',
	startedAt: startedAt.toISOString(),
	closedAt: closedAt?.toISOString() ?? null,
	passed: passed === null ? null : passed === 1
});
