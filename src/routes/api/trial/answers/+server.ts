import { trialAnswerRequest } from '$lib/schemas/trial';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { answerTrial } from '$lib/server/services/trial/answer-trial';
import type { RequestHandler } from './$types';

/** For anyone who holds a trial's token. */
export const POST: RequestHandler = ({ getClientAddress, request }) =>
	respondJson(async () =>
		answerTrial(await readJson(request, trialAnswerRequest), getClientAddress(), new Date())
	);
