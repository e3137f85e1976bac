/** What a repository keeps of proofs: for each exercise what was proven, and of which text. */
import { z } from 'zod';
import { LIMITS, type ProofTable } from './proof-table';

/** A report stands on this many seeds, from seed 1. */
export const REPORT_SEEDS = 200;

const share = z.number().min(0).max(1);
export const reportEntry = z.strictObject({
	/** Its file under content/, without the ending. */
	exercise: z.string(),
	/** SHA-256 of that file as it was proven, hexadecimal. */
	sha256: z.string().regex(/^[0-9a-f]{64}$/),
	seeds: z.int().min(REPORT_SEEDS),
	/** How often the taught method passes: on the question where it does so least. */
	taughtPasses: share.min(LIMITS.taughtPasses),
	/** How often a mistake passes: the one that does so most. */
	mistakePasses: share.max(LIMITS.mistakePasses),
	/** How often the mistake named is the one made: of the one that is named least. */
	named: share.min(LIMITS.named),
	/** How often all mistakes stand apart. */
	apart: share.min(LIMITS.made)
});
export const proofReport = z.array(reportEntry);
export type ReportEntry = z.infer<typeof reportEntry>;

/** Shares to a thousandth. */
const rounded = (value: number): number => Math.round(1000 * value) / 1000;

/** A proven exercise's line of the report. */
export function entryOf(
	exercise: string,
	sha256: string,
	{ seeds, rows, apartShare }: ProofTable
): ReportEntry {
	const taught = rows.filter(({ mistake }) => mistake === null);
	const made = rows.filter(({ mistake }) => mistake !== null);
	return {
		exercise,
		sha256,
		seeds,
		taughtPasses: rounded(Math.min(1, ...taught.map(({ passShare }) => passShare))),
		mistakePasses: rounded(Math.max(0, ...made.map(({ passShare }) => passShare))),
		named: rounded(Math.min(1, ...made.map(({ namedShare }) => namedShare))),
		apart: rounded(apartShare)
	};
}

/** A report with `proven` in the place of what it said of them, and of the others only those in `existing`; in order. */
export const updatedReport = (
	report: readonly ReportEntry[],
	proven: readonly ReportEntry[],
	existing: readonly string[]
): ReportEntry[] =>
	[...report.filter(({ exercise }) => proven.every((one) => one.exercise !== exercise)), ...proven]
		.filter(({ exercise }) => existing.includes(exercise))
		.sort((a, b) => (a.exercise < b.exercise ? -1 : 1));
