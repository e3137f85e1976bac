/** The one thing a learner does next, and why: from the course in its order, what they have done, and the day. */
import type { CourseProgress, ExerciseProgress, NextStep, UnitProgress } from '$lib/schemas/course-view';
import { ordinal } from '$lib/units/ordinal';
import { dayOf } from './day';
import { GAPS_DAYS } from './repeats';

type Placed = { unit: UnitProgress; exercise: ExerciseProgress };

const placed = (courses: readonly CourseProgress[]): Placed[] =>
	courses.flatMap(({ units }) =>
		units.flatMap((unit) => unit.exercises.map((exercise) => ({ unit, exercise })))
	);
const isOpen = ({ exercise }: Placed): boolean => exercise.openAttemptId !== null;
const lastClosed = ({ exercise }: Placed): string =>
	exercise.attempts.reduce((last, { closedAt }) => (closedAt && closedAt > last ? closedAt : last), '');

/**
 * An attempt that is open comes first, then what is due for a repeat, then the next exercise of the unit last worked in or, after
 * it, of the first in the course; and where that unit hasn't been begun, its lesson.
 */
export function nextStep(courses: readonly CourseProgress[]): NextStep {
	const all = placed(courses);
	return goOn(all) ?? repeat(all) ?? exerciseOrLesson(all) ?? nothing(all);
}

const exerciseStep = (
	kind: NextStep['kind'],
	{ unit, exercise }: Placed,
	rest: Pick<NextStep, 'act' | 'why'>
) => ({
	kind,
	place: {
		unit: { number: unit.number, title: unit.title },
		number: exercise.number,
		title: exercise.title
	},
	href: `/learn/exercises/${exercise.slug}`,
	also: null,
	...rest
});

function goOn(all: Placed[]): NextStep | null {
	const newest = all.filter(isOpen).sort((a, b) => openId(b) - openId(a));
	const next = newest.at(0);
	if (!next) return null;
	const { attempts } = next.exercise;
	const open = attempts.find(({ id }) => id === openId(next));
	const what = open?.practice ? 'practice' : `${ordinal(open?.number ?? attempts.length)} attempt`;
	return {
		...exerciseStep('go-on', next, {
			act: 'Go on where you were',
			why: `Your ${what} is open, and the bench stands as you left it.`
		}),
		href: `/learn/attempts/${openId(next)}`
	};
}
const openId = ({ exercise }: Placed): number => exercise.openAttemptId ?? 0;

function repeat(all: Placed[]): NextStep | null {
	const due = all
		.filter(({ unit, exercise }) => unit.lock === null && exercise.repeat?.due)
		.sort((a, b) => String(a.exercise.repeat?.dueAt).localeCompare(String(b.exercise.repeat?.dueAt)));
	const next = due.at(0);
	if (!next?.exercise.repeat) return null;
	const { missedAt, number, of } = next.exercise.repeat;
	const gaps = `${GAPS_DAYS.slice(0, -1).join(', ')} and ${GAPS_DAYS.at(-1)} days`;
	return exerciseStep('repeat', next, {
		act: 'Repeat it on a fresh signal',
		why: `You missed it on ${dayOf(missedAt)}. What is missed comes back after ${gaps}; this is the ${ordinal(number)} of ${of} repeats.`
	});
}

function exerciseOrLesson(all: Placed[]): NextStep | null {
	const toDo = all.filter(
		({ unit, exercise }) =>
			unit.lock === null &&
			exercise.triesLeft > 0 &&
			['not-started', 'not-passed'].includes(exercise.standing)
	);
	const worked = all.filter(lastClosed).sort((a, b) => lastClosed(b).localeCompare(lastClosed(a)));
	const current = worked.at(0)?.unit;
	const next = toDo.find(({ unit }) => unit === current) ?? toDo.at(0);
	if (!next) return null;
	const { unit, exercise } = next;
	const begun = unit.exercises.some(({ attempts }) => attempts.length > 0);
	if (begun)
		return exerciseStep('exercise', next, {
			act: exercise.attempts.length > 0 ? 'Try it again' : 'Look at the exercise',
			why: reasonFor(next, all)
		});
	return {
		kind: 'lesson',
		place: { unit: { number: unit.number, title: unit.title }, number: null, title: unit.title },
		href: `/learn/units/${unit.slug}`,
		act: 'Open the lesson',
		also: {
			href: `/learn/exercises/${exercise.slug}`,
			text: `Straight to exercise ${unit.number}.${exercise.number}`
		},
		why: worked.length === 0 ? 'The course begins here.' : whyUnit(unit, current)
	};
}

const whyUnit = (unit: UnitProgress, current: UnitProgress | undefined): string =>
	current && current.number < unit.number
		? `You have done what there was to do in unit ${current.number}; unit ${unit.number} begins with its lesson.`
		: 'It is the first unit that you haven’t begun, and begins with its lesson.';

function reasonFor(next: Placed, all: Placed[]): string {
	const { attempts, triesLeft } = next.exercise;
	if (attempts.length > 0)
		return `The ${ordinal(attempts.length)} attempt was not right; ${triesLeft} ${triesLeft === 1 ? 'try is' : 'tries are'} left, each with a signal of its own.`;
	const before = all[all.indexOf(next) - 1];
	if (before?.exercise.standing === 'passed')
		return `It follows ${before.exercise.title}, which you have right.`;
	return `It is the next in unit ${next.unit.number} that you haven’t begun.`;
}

function nothing(all: Placed[]): NextStep {
	const coming = all
		.flatMap(({ unit, exercise }) => (unit.lock === null && exercise.repeat ? [exercise.repeat.dueAt] : []))
		.sort()
		.at(0);
	const rest = { place: null, href: null, act: null, also: null };
	const then = coming ? ` The next repeat is due on ${dayOf(coming)}.` : '';
	if (all.every(({ exercise }) => exercise.standing === 'passed'))
		return { ...rest, kind: coming ? 'wait' : 'done', why: `Every exercise of the course is right.${then}` };
	const why =
		'No exercise that is open to you has a try left. Practise what is not right yet, or ask your instructor.';
	return { ...rest, kind: coming ? 'wait' : 'stuck', why: `${why}${then}` };
}

/** The attempt that closed last with a finding, if any has. */
export function lastFinding(courses: readonly CourseProgress[]) {
	const closed = placed(courses).flatMap(({ exercise }) =>
		exercise.attempts
			.filter(({ closedAt, passed }) => closedAt !== null && passed !== null)
			.map((attempt) => ({ exercise, attempt }))
	);
	return (
		closed.sort((a, b) => String(b.attempt.closedAt).localeCompare(String(a.attempt.closedAt))).at(0) ?? null
	);
}
