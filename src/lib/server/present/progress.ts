import type { AttemptLineView, ExerciseProgress } from '$lib/schemas/course-view';

interface AttemptRecord {
	id: number;
	number: number;
	startedAt: Date;
	closedAt: Date | null;
	/** As the database says it; null while the attempt is open. */
	passed: 0 | 1 | null;
	questions: number;
	answered: number;
	rightAnswers: number;
}

/** An exercise with what this person has done at it. @param attempts theirs, oldest first */
export function presentProgress(
	exercise: { slug: string; title: string; number: number; tries: number },
	attempts: AttemptRecord[]
): ExerciseProgress {
	const open = attempts.find(({ closedAt }) => closedAt === null);
	const best = bestOf(attempts);
	return {
		slug: exercise.slug,
		title: exercise.title,
		number: exercise.number,
		tries: exercise.tries,
		triesLeft: Math.max(0, exercise.tries - attempts.length),
		standing: standingOf(attempts, open !== undefined),
		openAttemptId: open?.id ?? null,
		attempts: attempts.map((attempt) => presentAttemptLine(attempt, attempt === best))
	};
}

/** The attempt that counts: the first passed, else the first with most answers right. */
function bestOf(attempts: AttemptRecord[]): AttemptRecord | undefined {
	const worth = ({ passed, rightAnswers }: AttemptRecord) => (passed === 1 ? Infinity : rightAnswers);
	const most = Math.max(0, ...attempts.map(worth));
	return most > 0 ? attempts.find((attempt) => worth(attempt) === most) : undefined;
}

function standingOf(attempts: AttemptRecord[], open: boolean): ExerciseProgress['standing'] {
	if (attempts.some(({ passed }) => passed === 1)) return 'passed';
	if (open) return 'open';
	return attempts.length === 0 ? 'not-started' : 'not-passed';
}

const presentAttemptLine = (attempt: AttemptRecord, counts: boolean): AttemptLineView => {
	const { id, number, startedAt, closedAt, passed, questions, answered, rightAnswers } = attempt;
	return {
		id,
		number,
		state: closedAt ? 'closed' : 'open',
		startedAt: startedAt.toISOString(),
		closedAt: closedAt?.toISOString() ?? null,
		passed: passed === null ? null : passed === 1,
		questions,
		answered,
		rightAnswers,
		counts
	};
};
