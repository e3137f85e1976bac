import type { AttemptView } from '$lib/schemas/attempt';
import type { Actor } from '$lib/server/domain/role';
import { getAttempt } from './get-attempt';
import { viewAttempt } from './view-attempt';

/** An attempt as its bench page shows it, from whichever device. @throws DomainError `not_found` */
export async function getAttemptView(actor: Actor, attemptId: number): Promise<AttemptView> {
	return viewAttempt(await getAttempt(actor, 'attempt.read', attemptId));
}
