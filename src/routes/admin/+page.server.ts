import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { getPeopleOverview } from '$lib/server/services/overviews/get-people-overview';
import { getServerState } from '$lib/server/services/overviews/get-server-state';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return respond(async () => ({
		server: await getServerState(actor, new Date()),
		...(await getPeopleOverview(actor))
	}));
};
