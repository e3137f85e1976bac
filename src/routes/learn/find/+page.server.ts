import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { findInCourses } from '$lib/server/services/find/find-in-courses';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	const query = event.url.searchParams.get('q') ?? '';
	return { found: await respond(() => findInCourses(actor, query)) };
};
