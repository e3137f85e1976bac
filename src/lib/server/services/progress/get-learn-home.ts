import type { LearnHome } from '$lib/schemas/course-view';
import { lastFinding, nextStep } from '$lib/server/domain/progress/next-step';
import type { Actor } from '$lib/server/domain/role';
import { listCourses } from '../courses/list-course';

/** A learner's home: the one next step and why, the last finding, and every course with what they have done in it. */
export async function getLearnHome(actor: Actor, now: Date): Promise<LearnHome> {
	const courses = await listCourses(actor, now);
	const last = lastFinding(courses);
	return {
		courses,
		next: nextStep(courses),
		last: last && { exerciseTitle: last.exercise.title, attempt: last.attempt }
	};
}
