import type { HintResponse } from '$lib/schemas/attempt';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { lockOpenAttempt } from './get-attempt';
import { drawnFor } from './prepared-bench';
import { exerciseOf, signalSource } from './signal-source';

/** Shows the next hint, and notes that it was shown. @throws DomainError `conflict` when there is none left */
export function revealHint(actor: Actor, attemptId: number): Promise<HintResponse> {
	return inTransaction(async (transaction) => {
		const attempt = await lockOpenAttempt(actor, attemptId, transaction);
		const source = signalSource(attempt, await exerciseOf(attempt, transaction));
		const { hints } = drawnFor(source).brief;
		const hint = hints[attempt.hintsRevealed];
		if (hint === undefined) throw new DomainError('conflict', 'There are no more hints.');
		const revealed = attempt.hintsRevealed + 1;
		await attempt.update({ hintsRevealed: revealed }, { transaction });
		return { hint, revealed, left: hints.length - revealed };
	});
}
