import { logbookFilter } from '$lib/schemas/logbook';
import { requireActor } from '$lib/server/auth/require-actor';
import { parseWith } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { exportLogbookCsv } from '$lib/server/services/logbook/export-csv';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, url }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const filter = parseWith(logbookFilter, Object.fromEntries(url.searchParams));
		return new Response(await exportLogbookCsv(actor, filter), {
			headers: {
				'content-type': 'text/csv; charset=utf-8',
				'content-disposition': 'attachment; filename="logbook.csv"',
				'cache-control': 'private, no-store'
			}
		});
	});
