import { requireActor } from '$lib/server/auth/require-actor';
import { readBytes } from '$lib/server/read-json';
import { respondJson, respondWith } from '$lib/server/respond';
import { exportZip, importZip } from '$lib/server/services/course-zips/course-zip';
import { ZIP_LIMITS } from '$lib/server/services/course-zips/read-zip';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params }) =>
	respondWith(async () => {
		const actor = requireActor(locals);
		const zip = await exportZip(actor, params.course);
		return new Response(new Uint8Array(zip), {
			headers: {
				'content-type': 'application/zip',
				'content-disposition': `attachment; filename="${params.course}.zip"`
			}
		});
	});

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const zip = await readBytes(request, ZIP_LIMITS.zipBytes);
		await importZip(actor, params.course, zip, new Date());
		return { course: params.course };
	});
