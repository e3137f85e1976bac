/** One line of the readings table. */
import type { Reading, ReadingProblem } from '$lib/measure/reading';
import type { BenchRequest } from '$lib/schemas/reading';

export type Outcome =
	| Pick<Reading, 'value' | 'unit' | 'spread' | 'remarks' | 'parts'>
	| Pick<ReadingProblem, 'problem' | 'needs'>;

export interface ReadingRow {
	/** Stable from sweep to sweep. */
	key: string;
	/** Present on a marker's row. */
	letter?: string;
	/** Present on a count that was refused: its number among those. */
	refusedId?: number;
	/** Present on a row the server took: its number. */
	takenId?: number;
	request: BenchRequest;
	/** Number of the trace, 1 to 4; absent on a count. */
	trace?: number;
	words: string;
	/** Where it stands, Hz; absent where a reading has no place. */
	atHz?: number;
	/** The place is a difference. */
	relative?: boolean;
	outcome: Outcome | undefined;
	/** "sweep 14, trace 1" */
	takenFrom: string;
}
