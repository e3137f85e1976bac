import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { getLesson } from '$lib/server/services/courses/get-lesson';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { lesson: await respond(() => getLesson(actor, event.params.slug, new Date())) };
};
