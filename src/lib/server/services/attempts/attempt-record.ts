import type { AttemptRecord, BenchReading, GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { Reading } from '$lib/server/db/models/reading';
import type { SetUp } from '$lib/server/db/models/set-up';

/** What an attempt left behind, as the grader takes it: only what was drawn counts as swept. */
export function attemptRecord(
	log: SetUp[],
	readings: Reading[],
	answers: Record<string, GivenAnswer>
): AttemptRecord {
	return {
		log: log.map((setUp) => ({
			settings: setUp.settings,
			firstRow: setUp.firstRow,
			sweeps: setUp.drawnTo === null ? 0 : setUp.drawnTo - setUp.firstRow + 1,
			clockS: setUp.clockS,
			at: setUp.loggedAt.toISOString()
		})),
		readings: readings.map((taken) => ({
			id: String(taken.id),
			request: taken.request,
			reading: readingOf(taken),
			trace: taken.trace ?? 1,
			rows: { from: taken.fromRow, to: taken.toRow },
			at: taken.takenAt.toISOString()
		})),
		answers
	};
}

/** The columns hold what was read off or counted; their types say no more than that each is a column. */
function readingOf({ kind, value, unit, spread, remarks, parts }: Reading): BenchReading {
	return {
		kind,
		value,
		unit,
		spread,
		remarks,
		...((parts ?? null) === null ? {} : { parts })
	} as BenchReading;
}
