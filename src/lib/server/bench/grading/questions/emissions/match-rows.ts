import type { EmissionsAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { EmissionsQuestion } from '$lib/server/bench/exercise/drawn-exercise';

type Row = EmissionsAnswer['rows'][number];
export interface Matched {
	/** Each true emission with the row that meant it. */
	pairs: { emission: EmissionsQuestion['emissions'][number]; row: Row | null }[];
	/** Rows that are none of them, with the ghost that each was taken from. */
	strangers: { row: Row; ghost: EmissionsQuestion['ghosts'][number] | undefined }[];
}

/** Every emission takes the nearest row within the tolerance that no other has taken. */
export function matchRows(
	{ emissions, ghosts, toleranceHz }: EmissionsQuestion,
	rows: readonly Row[]
): Matched {
	const left = [...rows];
	const pairs = emissions.map((emission) => {
		const away = (row: Row) => Math.abs(row.atHz - emission.atHz);
		const [nearest] = left.filter((row) => away(row) <= toleranceHz).sort((a, b) => away(a) - away(b));
		if (nearest) left.splice(left.indexOf(nearest), 1);
		return { emission, row: nearest ?? null };
	});
	const strangers = left.map((row) => ({
		row,
		ghost: ghosts.find(({ atHz }) => Math.abs(row.atHz - atHz) <= toleranceHz)
	}));
	return { pairs, strangers };
}
