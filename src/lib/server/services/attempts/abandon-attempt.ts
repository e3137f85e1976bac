import type { FindingResponse } from '$lib/schemas/attempt';
import type { Actor } from '$lib/server/domain/role';
import { closeAttempt } from './close-attempt';

/**
 * Ends an attempt without answers. It counts as a try, and its finding shows the signal and how it is measured.
 * @throws DomainError `conflict` when it has been closed already
 */
export async function abandonAttempt(actor: Actor, attemptId: number, now: Date): Promise<FindingResponse> {
	const nothing = () => Promise.resolve({ typed: {}, given: {} });
	return { finding: await closeAttempt(actor, attemptId, nothing, now) };
}
