import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { BenchError } from '$lib/server/bench/bench-error';
import { entryOf, proofReport, updatedReport } from '$lib/server/bench/proof/proof-report';
import type { ProofTable } from '$lib/server/bench/proof/proof-table';
import { exerciseFiles } from '../asked-exercises';

/** Committed: what of content/ is proven. */
const REPORT = 'content/proofs.json';

/** An exercise's name in the report; undefined for a file that isn't in content/. */
const nameOf = (file: string): string | undefined => /^content\/(.+)\.yaml$/.exec(file)?.[1];

/** @throws BenchError for a file outside content/ */
export function reportedName(file: string): string {
	const name = nameOf(file);
	if (name !== undefined) return name;
	throw new BenchError('write', `write: the report is of exercises in content/; given ${file}`);
}

/**
 * Writes into the report what was proven; takes out what failed, and what is no more.
 * @param proofs of exercises in content/
 */
export function writeReport(proofs: readonly { file: string; table: ProofTable }[]): void {
	const before = existsSync(REPORT) ? proofReport.parse(JSON.parse(readFileSync(REPORT, 'utf8'))) : [];
	const proven = proofs
		.filter(({ table }) => table.passed)
		.map(({ file, table }) => entryOf(reportedName(file), hashOf(file), table));
	const failed = proofs.filter(({ table }) => !table.passed).map(({ file }) => reportedName(file));
	const existing = exerciseFiles().flatMap((file) => nameOf(file) ?? []);
	const report = updatedReport(
		before,
		proven,
		existing.filter((name) => !failed.includes(name))
	);
	writeFileSync(REPORT, `${JSON.stringify(report, null, '\t')}\n`);
}

const hashOf = (file: string): string => createHash('sha256').update(readFileSync(file)).digest('hex');
