import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { getLearnHome } from '$lib/server/services/progress/get-learn-home';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { home: await respond(() => getLearnHome(actor, new Date())) };
};
