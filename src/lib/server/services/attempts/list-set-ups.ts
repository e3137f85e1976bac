import type { SetUpsResponse } from '$lib/schemas/set-up-log';
import { describeSettings } from '$lib/server/bench/grading/describe-settings';
import type { Actor } from '$lib/server/domain/role';
import { getAttempt } from './get-attempt';
import { resolvedFor } from './prepared-bench';
import { setUpLog } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';

/** The set-ups of an attempt that swept, oldest first: what was set, and the rows to ask for to see them again. */
export async function listSetUps(actor: Actor, attemptId: number): Promise<SetUpsResponse> {
	const attempt = await getAttempt(actor, 'attempt.read', attemptId);
	const source = signalSource(attempt, await exerciseOf(attempt));
	const log = (await setUpLog(attemptId)).filter(({ tripped }) => !tripped);
	return {
		setUps: log.map((setUp, i) => ({
			number: setUp.number,
			text: describeSettings(log[i - 1]?.settings, setUp.settings),
			settings: setUp.settings,
			resolved: resolvedFor(source, setUp.settings),
			rows: setUp.drawnTo === null ? null : { from: setUp.firstRow, to: setUp.drawnTo },
			at: setUp.loggedAt.toISOString()
		}))
	};
}
