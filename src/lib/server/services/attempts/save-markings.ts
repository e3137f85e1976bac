import type { MarkingsRequest, MarkingsResponse } from '$lib/schemas/markings';
import { AttemptMarkings } from '$lib/server/db/models/attempt-markings';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { lockOpenAttempt } from './get-attempt';

/** Keeps what lies on the bench besides its set-up, in place of what was kept before. */
export function saveMarkings(
	actor: Actor,
	attemptId: number,
	{ markings }: MarkingsRequest,
	now: Date
): Promise<MarkingsResponse> {
	return inTransaction(async (transaction) => {
		await lockOpenAttempt(actor, attemptId, transaction);
		await AttemptMarkings.upsert({ attemptId, markings, savedAt: now }, { transaction });
		return { savedAt: now.toISOString() };
	});
}
