import type { AttemptLineView, ExerciseProgress, RepeatView } from '$lib/schemas/course-view';
import { GAPS_DAYS, isDue, repeatOf } from '$lib/server/domain/progress/repeats';

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
	/** Of those, the ones whose method was right too. */
	cleanAnswers: number;
	practice: 0 | 1;
}

/** An exercise with what this person has done at it. @param attempts theirs, oldest first */
export function presentProgress(
	exercise: { slug: string; title: string; number: number; tries: number },
	attempts: AttemptRecord[],
	now: Date
): ExerciseProgress {
	const open = attempts.find(({ closedAt }) => closedAt === null);
	const counted = attempts.filter(({ practice }) => practice === 0);
	const best = bestOf(counted);
	return {
		slug: exercise.slug,
		title: exercise.title,
		number: exercise.number,
		tries: exercise.tries,
		triesLeft: triesLeft(exercise, attempts),
		standing: standingOf(counted),
		openAttemptId: open?.id ?? null,
		repeat: presentRepeat(attempts, now),
		attempts: attempts.map((attempt) => presentAttemptLine(attempt, attempt === best))
	};
}

/** Practice takes no try. */
export const triesLeft = (
	{ tries }: { tries: number },
	attempts: readonly Pick<AttemptRecord, 'practice'>[]
): number => Math.max(0, tries - attempts.filter(({ practice }) => practice === 0).length);

/** What comes back of it, and when; null for nothing. Practice moves it like any other attempt. */
function presentRepeat(attempts: readonly AttemptRecord[], now: Date): RepeatView | null {
	const closed = attempts.flatMap(({ closedAt, passed, questions, cleanAnswers }) =>
		closedAt && passed !== null ? [{ closedAt, missed: cleanAnswers < questions }] : []
	);
	const repeat = repeatOf(closed.sort((a, b) => a.closedAt.getTime() - b.closedAt.getTime()));
	return (
		repeat && {
			missedAt: repeat.missedAt.toISOString(),
			dueAt: repeat.dueAt.toISOString(),
			due: isDue(repeat, now),
			number: repeat.step + 1,
			of: GAPS_DAYS.length
		}
	);
}

/** The attempt that counts: the first passed, else the first with most answers right. */
function bestOf(attempts: AttemptRecord[]): AttemptRecord | undefined {
	const worth = ({ passed, rightAnswers }: AttemptRecord) => (passed === 1 ? Infinity : rightAnswers);
	const most = Math.max(0, ...attempts.map(worth));
	return most > 0 ? attempts.find((attempt) => worth(attempt) === most) : undefined;
}

function standingOf(attempts: AttemptRecord[]): ExerciseProgress['standing'] {
	if (attempts.some(({ passed }) => passed === 1)) return 'passed';
	if (attempts.some(({ closedAt }) => closedAt === null)) return 'open';
	return attempts.length === 0 ? 'not-started' : 'not-passed';
}

const presentAttemptLine = (attempt: AttemptRecord, counts: boolean): AttemptLineView => {
	const { id, number, startedAt, closedAt, passed, questions, answered, rightAnswers, practice } = attempt;
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
		counts,
		practice: practice === 1
	};
};
