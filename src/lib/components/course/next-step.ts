/** What a learner does next, and why: from the course in its order and what they have done. */
import type { CourseProgress, ExerciseProgress, UnitProgress } from '$lib/schemas/course-view';
import { ordinal } from './ordinal';

type Placed = { unit: Pick<UnitProgress, 'number' | 'title'>; exercise: ExerciseProgress };

export interface NextStep {
	/** Null when there is nothing to begin. */
	exercise: Placed | null;
	why: string;
}

const placed = (courses: readonly CourseProgress[]): Placed[] =>
	courses.flatMap(({ units }) =>
		units.flatMap((unit) => unit.exercises.map((exercise) => ({ unit, exercise })))
	);

/** The first exercise in the course's order that is neither right nor open and has a try left. */
export function nextStep(courses: readonly CourseProgress[]): NextStep {
	const all = placed(courses);
	const unfinished = all.filter(({ exercise }) => exercise.standing !== 'passed');
	if (unfinished.length === 0) return { exercise: null, why: 'Every exercise of the course is right.' };
	const next = unfinished.find(({ exercise }) => exercise.standing !== 'open' && exercise.triesLeft > 0);
	if (!next) {
		const open = unfinished.some(({ exercise }) => exercise.standing === 'open');
		return {
			exercise: null,
			why: open
				? 'What is open comes first.'
				: 'No exercise has a try left. Your instructor can say how to go on.'
		};
	}
	return { exercise: next, why: reasonFor(next, all) };
}

function reasonFor(next: Placed, all: Placed[]): string {
	const { attempts, triesLeft } = next.exercise;
	if (attempts.length > 0)
		return `The ${ordinal(attempts.length)} attempt was not right; ${triesLeft} ${triesLeft === 1 ? 'try is' : 'tries are'} left, each with a signal of its own.`;
	const before = all[all.indexOf(next) - 1];
	if (!before) return 'The course begins here.';
	if (before.exercise.standing === 'passed')
		return `It follows ${before.exercise.title}, which you have right.`;
	return 'It is the next in the course that you haven’t begun.';
}

/** The attempt that closed last, if any has. */
export function lastFinding(courses: readonly CourseProgress[]) {
	const closed = placed(courses).flatMap(({ unit, exercise }) =>
		exercise.attempts
			.filter(({ closedAt, passed }) => closedAt !== null && passed !== null)
			.map((attempt) => ({ unit, exercise, attempt }))
	);
	return (
		closed.sort((a, b) => String(b.attempt.closedAt).localeCompare(String(a.attempt.closedAt))).at(0) ?? null
	);
}
