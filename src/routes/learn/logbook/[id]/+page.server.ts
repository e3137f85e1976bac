import { fail, redirect } from '@sveltejs/kit';
import { noteForm } from '$lib/schemas/logbook';
import { requireUser } from '$lib/server/auth/require-actor';
import { readForm } from '$lib/server/read-form';
import { readId } from '$lib/server/read-id';
import { parseWith } from '$lib/server/read-json';
import { refusalOf, respond } from '$lib/server/respond';
import { getEntry, noteEntry, removeEntry } from '$lib/server/services/logbook/own-entry';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { entry: await respond(() => getEntry(actor, readId(event.params.id, 'entry'))) };
};

export const actions = {
	note: async (event) => {
		const actor = requireUser(event);
		const id = await respond(() => readId(event.params.id, 'entry'));
		const typed = await respond(() => readForm(event.request));
		try {
			const { note } = parseWith(noteForm, typed);
			await noteEntry(actor, id, note);
			return { done: 'Note kept.', message: undefined, note };
		} catch (cause) {
			const { status, message, issues } = refusalOf(cause);
			const note = typeof typed.note === 'string' ? typed.note : '';
			return fail(status, { done: undefined, message: issues.at(0)?.message ?? message, note });
		}
	},
	remove: async (event) => {
		const actor = requireUser(event);
		await respond(() => removeEntry(actor, readId(event.params.id, 'entry')));
		redirect(303, '/learn/logbook');
	}
} satisfies Actions;
