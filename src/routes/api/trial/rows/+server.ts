import { trialRowRequest } from '$lib/schemas/trial';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { takeTrialSweep } from '$lib/server/services/trial/take-trial-sweep';
import type { RequestHandler } from './$types';

/** For anyone who holds a trial's token. */
export const POST: RequestHandler = ({ getClientAddress, request }) =>
	respondJson(async () =>
		takeTrialSweep(await readJson(request, trialRowRequest), getClientAddress(), new Date())
	);
