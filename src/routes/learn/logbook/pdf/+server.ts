import { documentQuery } from '$lib/schemas/logbook';
import { requireActor } from '$lib/server/auth/require-actor';
import { parseWith } from '$lib/server/read-json';
import { respondWith } from '$lib/server/respond';
import { exportLogbookPdf } from '$lib/server/services/logbook/export-pdf';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, url }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const { entry } = parseWith(documentQuery, {
			...Object.fromEntries(url.searchParams),
			entry: url.searchParams.getAll('entry')
		});
		const document = await exportLogbookPdf(actor, entry, new Date());
		return new Response(new Uint8Array(document), {
			headers: {
				'content-type': 'application/pdf',
				'content-disposition': 'attachment; filename="logbook.pdf"',
				'cache-control': 'private, no-store'
			}
		});
	});
