import type { TrialView } from '$lib/schemas/trial';
import { DomainError } from '$lib/server/errors';
import { startTrial } from './start-trial';

/** A trial to show with the front page; null when there is none to be had just now. The page itself must never fail for it. */
export async function offerTrial(address: string, now: Date): Promise<TrialView | null> {
	try {
		return await startTrial(address, now);
	} catch (cause) {
		if (cause instanceof DomainError) return null;
		throw cause;
	}
}
