import { requireActor } from '$lib/server/auth/require-actor';
import { readBytes } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { createCourseFromZip } from '$lib/server/services/course-zips/course-zip';
import { ZIP_LIMITS } from '$lib/server/services/course-zips/read-zip';
import type { RequestHandler } from './$types';

/** A new course from a zip. */
export const POST: RequestHandler = ({ locals, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const zip = await readBytes(request, ZIP_LIMITS.zipBytes);
		return { course: await createCourseFromZip(actor, zip, new Date()) };
	}, 201);
