import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respondWith } from '$lib/server/respond';
import { exportLogbookPdf } from '$lib/server/services/logbook/export-pdf';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, url }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const ids = url.searchParams.getAll('entry').map((text) => readId(text, 'entry'));
		const document = await exportLogbookPdf(actor, ids, new Date());
		return new Response(new Uint8Array(document), {
			headers: {
				'content-type': 'application/pdf',
				'content-disposition': 'attachment; filename="logbook.pdf"',
				'cache-control': 'private, no-store'
			}
		});
	});
