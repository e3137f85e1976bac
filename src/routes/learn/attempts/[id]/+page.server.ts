import { redirect } from '@sveltejs/kit';
import { requireUser } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respond } from '$lib/server/respond';
import { getAttemptView } from '$lib/server/services/attempts/get-attempt-view';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	const attempt = await respond(() => getAttemptView(actor, readId(event.params.id, 'attempt')));
	if (attempt.state === 'closed') redirect(303, `/learn/attempts/${attempt.id}/finding`);
	return { attempt };
};
