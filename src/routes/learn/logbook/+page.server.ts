import { logbookFilter } from '$lib/schemas/logbook';
import { requireUser } from '$lib/server/auth/require-actor';
import { parseWith } from '$lib/server/read-json';
import { respond } from '$lib/server/respond';
import { listLogbook } from '$lib/server/services/logbook/list-logbook';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return respond(async () => {
		const filter = parseWith(logbookFilter, Object.fromEntries(event.url.searchParams));
		return { filter, logbook: await listLogbook(actor, filter) };
	});
};
