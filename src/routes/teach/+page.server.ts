import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { getTeachOverview } from '$lib/server/services/overviews/get-teach-overview';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return respond(() => getTeachOverview(actor, new Date()));
};
