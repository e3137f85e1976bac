import type { TrialRowRequest, TrialSweep } from '$lib/schemas/trial';
import { trialSweeps } from './trial-limits';
import { openTrialBench, presentSweep, sweepTrial } from './trial-bench';

/**
 * One more sweep of a visitor's signal.
 * @throws DomainError `conflict` for a token that opens nothing; `invalid` for a resolution not offered; `too_many`
 */
export async function takeTrialSweep(
	{ token, choice, row }: TrialRowRequest,
	address: string,
	now: Date
): Promise<TrialSweep> {
	trialSweeps.spend(address, now);
	const bench = await openTrialBench(token, now);
	return presentSweep(choice, row, sweepTrial(bench, choice, row));
}
