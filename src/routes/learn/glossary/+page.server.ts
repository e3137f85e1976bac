import { requireUser } from '$lib/server/auth/require-actor';
import { respond } from '$lib/server/respond';
import { listGlossary } from '$lib/server/services/glossary/list-glossary';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async (event) => {
	const actor = requireUser(event);
	return { glossaries: await respond(() => listGlossary(actor)) };
};
