import { fileQuery, presenceRequest } from '$lib/schemas/desk';
import { requireActor } from '$lib/server/auth/require-actor';
import { parseWith, readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { wakeBackgroundWork } from '$lib/server/services/background/background-work';
import { askForProof, cancelProof, getProofState } from '$lib/server/services/proofs/ask-for-proof';
import type { RequestHandler } from './$types';

const pathIn = (url: URL): string => parseWith(fileQuery, Object.fromEntries(url.searchParams)).path;

export const GET: RequestHandler = ({ locals, params, url }) =>
	respondJson(() => {
		const actor = requireActor(locals);
		return getProofState(actor, params.course, pathIn(url));
	});

export const POST: RequestHandler = ({ locals, params, request }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const { path } = await readJson(request, presenceRequest);
		return askForProof(actor, params.course, path, new Date(), wakeBackgroundWork);
	});

export const DELETE: RequestHandler = ({ locals, params, url }) =>
	respondJson(() => {
		const actor = requireActor(locals);
		return cancelProof(actor, params.course, pathIn(url), new Date());
	});
