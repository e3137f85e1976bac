/** One line of the readings table. */
import type { Reading, ReadingProblem } from '$lib/measure/reading';
import type { ReadingRequest } from '$lib/schemas/reading';

export interface ReadingRow {
	/** Stable from sweep to sweep. */
	key: string;
	/** Present on a marker's row. */
	letter?: string;
	/** Present on a row the server took: its number. */
	takenId?: number;
	request: ReadingRequest;
	/** Number of the trace, 1 to 4. */
	trace: number;
	words: string;
	/** Where it stands, Hz; absent where a reading has no place. */
	atHz?: number;
	/** The place is a difference. */
	relative?: boolean;
	outcome: Pick<Reading, 'kind' | 'value' | 'unit' | 'spread' | 'remarks'> | ReadingProblem | undefined;
	/** "sweep 14, trace 1" */
	takenFrom: string;
}
