import type { Transaction } from 'sequelize';
import type { Attempt } from '$lib/server/db/models/attempt';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import type { AcknowledgementRequest, AcknowledgementResponse } from '$lib/schemas/sweep-stream';
import { firstUnfinishedRow } from './advance-bench';
import { lockOpenAttempt } from './get-attempt';
import { setUpLog, setUpOfRow } from './set-up-log';

/**
 * Notes that a row was drawn whole, and with it every earlier one of its set-up. Only what was drawn is evidence.
 * Never takes anything back: a lower row than before changes nothing.
 */
export function acknowledgeRows(
	actor: Actor,
	attemptId: number,
	{ row }: AcknowledgementRequest
): Promise<AcknowledgementResponse> {
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		const drawnTo = await markDrawn(attempt, row, transaction);
		if (drawnTo === null) {
			throw new DomainError('invalid', 'That row has not been swept.', {
				issues: [{ field: 'row', message: `must be a row already swept; row ${row} has not been` }]
			});
		}
		return { drawnTo };
	});
}

/**
 * Marks `row` and the earlier rows of its set-up as drawn. The attempt must be locked.
 * @returns the last row of that set-up known to be drawn; null when `row` hasn't been swept to its end
 */
export async function markDrawn(
	attempt: Attempt,
	row: number,
	transaction: Transaction
): Promise<number | null> {
	const setUp = setUpOfRow(await setUpLog(attempt.id, transaction), row);
	if (!setUp || row >= (setUp.endRow ?? firstUnfinishedRow(attempt))) return null;
	const drawnTo = Math.max(setUp.drawnTo ?? row, row);
	if (drawnTo !== setUp.drawnTo) await setUp.update({ drawnTo }, { transaction });
	return drawnTo;
}
