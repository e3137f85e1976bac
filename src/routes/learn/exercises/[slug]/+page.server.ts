import { redirect, fail } from '@sveltejs/kit';
import { requireUser } from '$lib/server/auth/require-actor';
import { refusalOf, respond } from '$lib/server/respond';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { getExerciseBrief } from '$lib/server/services/courses/get-exercise-brief';
import type { Actions, PageServerLoad, RequestEvent } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { brief: await respond(() => getExerciseBrief(actor, event.params.slug, new Date())) };
};

/** @param practice takes no try and never counts */
async function start(event: RequestEvent, practice: boolean) {
	const actor = requireUser(event);
	let attemptId: number;
	try {
		const { attempt } = await startAttempt(actor, event.params.slug, new Date(), practice);
		attemptId = attempt.id;
	} catch (cause) {
		const refusal = refusalOf(cause);
		return fail(refusal.status, { message: refusal.message });
	}
	redirect(303, `/learn/attempts/${attemptId}`);
}

export const actions = {
	start: (event) => start(event, false),
	practise: (event) => start(event, true)
} satisfies Actions;
