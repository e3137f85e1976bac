import type { FindingResponse } from '$lib/schemas/attempt';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { closeAttempt } from './close-attempt';
import { lockOpenAttempt } from './get-attempt';
import { exerciseOf } from './signal-source';

/**
 * Ends an attempt without answers. It counts as a try, and its finding shows the signal and how it is measured.
 * @throws DomainError `conflict` when it has been closed already
 */
export function abandonAttempt(actor: Actor, attemptId: number, now: Date): Promise<FindingResponse> {
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		const exercise = await exerciseOf(attempt, transaction);
		return {
			finding: await closeAttempt(attempt, exercise, { typed: {}, given: {} }, now, transaction)
		};
	});
}
