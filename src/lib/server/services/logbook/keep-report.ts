import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getAttempt } from '../attempts/get-attempt';
import { getReport } from '../attempts/get-report';
import { keepInLogbook } from './keep-in-logbook';

/** Readings of one report that are put by at once. */
const MOST = 40;

/**
 * Puts the picture of a report in the logbook, or its readings.
 * @returns how many entries that made; readings that are in it already make none
 * @throws DomainError `conflict` where there is none of it
 */
export async function keepReport(
	actor: Actor,
	attemptId: number,
	what: 'picture' | 'readings',
	now: Date
): Promise<number> {
	// Whoever may read another's report still keeps a logbook of their own work only.
	await getAttempt(actor, 'attempt.work', attemptId);
	const { picture, readings } = await getReport(actor, attemptId);
	const requests =
		what === 'readings'
			? readings.slice(0, MOST).map(({ id }) => ({ kind: 'reading' as const, readingId: id, note: '' }))
			: picture
				? [{ kind: 'picture' as const, row: picture.row, note: '' }]
				: [];
	if (requests.length === 0) throw new DomainError('conflict', `This report has no ${what}.`);
	let made = 0;
	for (const request of requests)
		if ((await keepInLogbook(actor, attemptId, request, now)).created) made += 1;
	return made;
}
