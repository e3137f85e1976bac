import { fail } from '@sveltejs/kit';
import { keepReportForm } from '$lib/schemas/logbook';
import { requireUser } from '$lib/server/auth/require-actor';
import { readForm } from '$lib/server/read-form';
import { readId } from '$lib/server/read-id';
import { parseWith } from '$lib/server/read-json';
import { refusalOf, respond } from '$lib/server/respond';
import { keepReport } from '$lib/server/services/logbook/keep-report';
import { getReport } from '$lib/server/services/attempts/get-report';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { report: await respond(() => getReport(actor, readId(event.params.id, 'attempt'))) };
};

export const actions = {
	/** Puts the picture or the readings in the logbook. */
	keep: async (event) => {
		const actor = requireUser(event);
		try {
			const attemptId = readId(event.params.id, 'attempt');
			const { what } = parseWith(keepReportForm, await readForm(event.request));
			const made = await keepReport(actor, attemptId, what, new Date());
			const many = made === 1 ? 'The reading is' : `${made} readings are`;
			const readings = made === 0 ? 'The readings were in the logbook already.' : `${many} in the logbook.`;
			return { kept: what === 'picture' ? 'The picture is in the logbook.' : readings, message: undefined };
		} catch (cause) {
			const { status, message } = refusalOf(cause);
			return fail(status, { kept: undefined, message });
		}
	}
} satisfies Actions;
