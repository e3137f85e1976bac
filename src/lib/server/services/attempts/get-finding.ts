import type { FindingResponse } from '$lib/schemas/attempt';
import { Finding } from '$lib/server/db/models/finding';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getAttempt } from './get-attempt';

/** What the grader said of a closed attempt. @throws DomainError `conflict` while it is open: truths stay here until then */
export async function getFinding(actor: Actor, attemptId: number): Promise<FindingResponse> {
	const attempt = await getAttempt(actor, 'attempt.read', attemptId);
	const stored = attempt.closedAt ? await Finding.findByPk(attemptId) : null;
	if (!stored) throw new DomainError('conflict', 'This attempt has not been handed in yet.');
	return { finding: stored.finding };
}
