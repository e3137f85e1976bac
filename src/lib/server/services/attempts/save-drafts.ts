import type { DraftsRequest, DraftsResponse } from '$lib/schemas/attempt';
import { Draft } from '$lib/server/db/models/draft';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { lockOpenAttempt } from './get-attempt';
import { refuseForeignParts } from './refuse-foreign-parts';

/** Keeps what is typed in the answer fields, right or wrong, in place of what was kept before. */
export function saveDrafts(
	actor: Actor,
	attemptId: number,
	{ answers }: DraftsRequest,
	now: Date
): Promise<DraftsResponse> {
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		await refuseForeignParts(attempt, answers, transaction);
		await Draft.upsert({ attemptId, answers, savedAt: now }, { transaction });
		return { savedAt: now.toISOString() };
	});
}
