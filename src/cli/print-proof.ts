import { brief } from '$lib/server/bench/proof/brief';
import type { ProofRow, ProofTable } from '$lib/server/bench/proof/proof-table';
import { printColumns } from './print-columns';

const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;
const HEADS = ['question', 'done by', 'passes', 'named', 'mean error', 'bias', 'scatter', 'edge', ''];

const cells = (row: ProofRow): string[] => [
	row.question,
	row.mistake ?? 'taught method',
	percent(row.passShare),
	row.mistake === null ? 'faultless '.concat(percent(row.namedShare)) : percent(row.namedShare),
	...(row.numbers === 0
		? ['', '', '', '']
		: [
				brief(row.meanError),
				row.mistake === null ? brief(row.bias) : '',
				brief(row.scatter),
				brief(row.edgeError)
			]),
	row.failures.length > 0 ? 'FAILS' : 'ok'
];

/**
 * A proof as a table of text: how often each way of doing it passes and is named, and what failed.
 * @param cpuS processor time that it took, s
 */
export function printProof(table: ProofTable, cpuS: number): string {
	const lines = [HEADS, ...table.rows.map(cells)];
	const last = table.fromSeed + table.seeds - 1;
	return [
		`${table.exercise}: seeds ${table.fromSeed} to ${last}, ${table.redraws} draws turned down, ${cpuS.toFixed(1)} s of one core`,
		...printColumns(lines, 2),
		`mistakes four spreads apart on ${percent(table.apartShare)} of the seeds`,
		...table.failures.map((failure) => `FAILS ${failure}`),
		''
	].join('\n');
}
