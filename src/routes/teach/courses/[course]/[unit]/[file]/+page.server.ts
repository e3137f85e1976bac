import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { editDraftFile } from '$lib/server/services/course-drafts/edit-draft-file';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	const { course, unit, file } = event.params;
	return { desk: await respond(() => editDraftFile(actor, course, `${unit}/${file}`)) };
};
