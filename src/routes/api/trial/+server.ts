import { respondJson } from '$lib/server/respond';
import { startTrial } from '$lib/server/services/trial/start-trial';
import type { RequestHandler } from './$types';

/** For anyone: a new signal on the front page's bench. */
export const POST: RequestHandler = ({ getClientAddress }) =>
	respondJson(() => startTrial(getClientAddress(), new Date()), 201);
