import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { enterRoom } from '$lib/server/services/accounts/enter-room';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	await respond(() => enterRoom(actor, 'teach.enter'));
};
