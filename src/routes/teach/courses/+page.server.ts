import { fail, redirect } from '@sveltejs/kit';
import { newCourse } from '$lib/schemas/desk';
import { requireUser } from '$lib/server/auth/require-actor';
import { readForm } from '$lib/server/read-form';
import { parseWith } from '$lib/server/read-json';
import { refusalOf, respond } from '$lib/server/respond';
import { createCourse } from '$lib/server/services/course-drafts/create-course';
import { refuseReaders } from '$lib/server/services/course-drafts/find-draft';
import { listAuthoredCourses } from '$lib/server/services/course-drafts/list-authored-courses';
import { startDraft } from '$lib/server/services/course-drafts/start-draft';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { courses: await respond(() => listAuthoredCourses(actor)) };
};

export const actions: Actions = {
	create: async (event) => {
		const actor = requireUser(event);
		let course: string;
		let typed: Record<string, FormDataEntryValue> = {};
		try {
			refuseReaders(actor);
			typed = await readForm(event.request);
			course = await createCourse(actor, parseWith(newCourse, typed), new Date());
		} catch (cause) {
			const { status, ...refusal } = refusalOf(cause);
			return fail(status, {
				...refusal,
				typed: Object.fromEntries(Object.entries(typed).map(([k, v]) => [k, String(v)]))
			});
		}
		redirect(303, `/teach/courses/${course}`);
	},
	start: async (event) => {
		const actor = requireUser(event);
		let course: string;
		try {
			course = String((await readForm(event.request)).course ?? '');
			await startDraft(actor, course, new Date());
		} catch (cause) {
			const { status, ...refusal } = refusalOf(cause);
			return fail(status, { ...refusal, typed: {} });
		}
		redirect(303, `/teach/courses/${course}`);
	}
};
