import { fail } from '@sveltejs/kit';
import { outlineChange } from '$lib/schemas/desk';
import { requireUser } from '$lib/server/auth/require-actor';
import { readForm } from '$lib/server/read-form';
import { parseWith } from '$lib/server/read-json';
import { refusalOf, respond } from '$lib/server/respond';
import { changeOutline } from '$lib/server/services/course-drafts/change-outline';
import { requireDraft } from '$lib/server/services/course-drafts/find-draft';
import { publishDraft } from '$lib/server/services/course-drafts/publish-draft';
import { viewDraft } from '$lib/server/services/course-drafts/view-draft';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { draft: await respond(() => viewDraft(actor, event.params.course)) };
};

export const actions: Actions = {
	change: async (event) => {
		const actor = requireUser(event);
		try {
			await requireDraft(actor, event.params.course);
			const change = parseWith(outlineChange, await readForm(event.request));
			await changeOutline(actor, event.params.course, change, new Date());
			return { changed: change.do };
		} catch (cause) {
			const { status, ...refusal } = refusalOf(cause);
			return fail(status, refusal);
		}
	},
	publish: async (event) => {
		const actor = requireUser(event);
		try {
			return { published: await publishDraft(actor, event.params.course, new Date()) };
		} catch (cause) {
			const { status, ...refusal } = refusalOf(cause);
			return fail(status, refusal);
		}
	}
};
