import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { getPeopleOverview } from '$lib/server/services/overviews/get-people-overview';
import { enterRoom } from '$lib/server/services/accounts/enter-room';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return respond(() => {
		enterRoom(actor, 'office.enter');
		return getPeopleOverview(actor);
	});
};
