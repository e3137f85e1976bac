import type { EmissionsAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { EmissionsQuestion, FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import type { WrongWay } from '../question-type';
import { matchRows } from './match-rows';

type Rows = EmissionsAnswer['rows'];

/** The taught table with one row left out, one verdict turned, or one ghost taken for an emission. */
export function wrongTables(question: EmissionsQuestion): WrongWay[] {
	const { id, emissions, ghosts, asksBreaks } = question;
	const way = (name: string, change: (rows: Rows) => Rows): WrongWay => ({
		id: name,
		make: (steps) =>
			steps.map((step): FilledStep => {
				if (step.do !== 'answer' || step.question !== id || !('gives' in step)) return step;
				return { ...step, gives: (from) => ({ rows: change((step.gives(from) as EmissionsAnswer).rows) }) };
			}),
		isNamed: ({ mistakes }) => mistakes.length === 1 && mistakes[0].kind === name
	});
	/** The row that means an emission. */
	const rowOf = (rows: Rows, emission: string) =>
		matchRows(question, rows).pairs.find((pair) => pair.emission.id === emission)?.row;
	return [
		...(emissions.length < 2
			? []
			: emissions.map((one) =>
					way(`missing-${one.id}`, (rows) => rows.filter((row) => row !== rowOf(rows, one.id)))
				)),
		...(asksBreaks
			? emissions.map((one) =>
					way(`limit-${one.id}`, (rows) => {
						const turned = rowOf(rows, one.id);
						return rows.map((row) => (row === turned ? { ...row, breaks: !row.breaks } : row));
					})
				)
			: []),
		...ghosts.map((ghost) =>
			way(ghost.id, (rows) => [
				...rows,
				{ atHz: ghost.atHz, levelDbm: -80, breaks: asksBreaks ? false : null }
			])
		)
	];
}
