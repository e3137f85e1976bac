import {
	LIMITS,
	type MisdiagnosisRow,
	type MisdiagnosisTable
} from '$lib/server/bench/proof/misdiagnosis/misdiagnosis-table';
import { printColumns } from './print-columns';

const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;
const HEADS = ['question', 'made', 'answers', 'harmless', 'named', '', 'said instead'];

function cells(row: MisdiagnosisRow): string[] {
	const least = row.mistake === null ? 1 - LIMITS.rightMarkedWrong : LIMITS.named;
	const low = row.made > row.harmless && row.rightShare < least;
	const shown = row.made > row.harmless ? percent(row.rightShare) : '–';
	return [
		row.question,
		row.mistake ?? 'no mistake',
		String(row.made),
		row.mistake === null ? '' : String(row.harmless),
		row.mistake === null ? `right ${shown}` : shown,
		low ? 'low' : '',
		row.notMade > 0 ? `${row.notMade} could not be made (${row.problem}) ${row.instead}` : row.instead
	];
}

/** What was named of each mistake made, and what was said instead. */
export function printMisdiagnosis(table: MisdiagnosisTable): string {
	const lines = [HEADS, ...table.rows.map(cells)];
	const columns = printColumns(
		lines.map((line) => line.slice(0, -1)),
		2
	);
	return [
		`${table.exercise}: ${table.wrongAnswers} wrong answers, ${percent(table.namedShare)} named rightly; ${table.rightAnswers} right ones, ${percent(table.rightMarkedWrong)} marked wrong`,
		...columns.map((line, i) =>
			`${line.padEnd(Math.max(...columns.map((one) => one.length)))}  ${lines[i].at(-1)}`.trimEnd()
		),
		...table.failures.map((failure) => `FAILS ${failure}`),
		''
	].join('\n');
}
