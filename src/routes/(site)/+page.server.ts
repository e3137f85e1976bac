import { offerTrial } from '$lib/server/services/trial/offer-trial';
import type { PageServerLoad } from './$types';

/** For anyone. Each look at the page gets a signal of its own; nothing of it is stored. */
export const load: PageServerLoad = async ({ getClientAddress }) => ({
	trial: await offerTrial(getClientAddress(), new Date())
});
