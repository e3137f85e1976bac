import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { listCourses } from '$lib/server/services/courses/list-course';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { courses: await respond(() => listCourses(actor)) };
};
