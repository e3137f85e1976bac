import { redirect } from '@sveltejs/kit';
import { requireUser } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { respond } from '$lib/server/respond';
import { getAttemptView } from '$lib/server/services/attempts/get-attempt-view';
import { getDoneRight } from '$lib/server/services/attempts/get-done-right';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	const attemptId = await respond(() => readId(event.params.id, 'attempt'));
	const attempt = await respond(() => getAttemptView(actor, attemptId));
	if (attempt.state === 'open') redirect(303, `/learn/attempts/${attempt.id}`);
	return { attempt, play: await respond(() => getDoneRight(actor, attemptId)) };
};
