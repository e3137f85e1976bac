import { requireUser } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respond } from '$lib/server/respond';
import { getReport } from '$lib/server/services/attempts/get-report';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { report: await respond(() => getReport(actor, readId(event.params.id, 'attempt'))) };
};
