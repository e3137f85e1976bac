import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { listSkills } from '$lib/server/services/progress/list-skills';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { courses: await respond(() => listSkills(actor, new Date())) };
};
