import { figureRequest } from '$lib/schemas/figure-view';
import { requireActor } from '$lib/server/auth/require-actor';
import { readId } from '$lib/server/read-id';
import { readJson } from '$lib/server/read-json';
import { respondJson } from '$lib/server/respond';
import { turnFigure } from '$lib/server/services/figures/turn-figure';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = ({ locals, params, request, getClientAddress }) =>
	respondJson(async () => {
		const actor = requireActor(locals);
		const place = {
			unitId: readId(params.unitId, 'unit'),
			figureId: params.figureId,
			address: getClientAddress()
		};
		return turnFigure(actor, place, await readJson(request, figureRequest), new Date());
	});
