/** Sweeps that can be looked at again: those kept here, or those of an earlier set-up fetched from the server. */
import type { ResolvedSettings } from '$lib/schemas/settings';
import type { KeptRow } from '../state/trace-set.svelte';

export interface Recording {
	/** The receiver as it swept them. */
	resolved: ResolvedSettings;
	/** Oldest first, never none. */
	rows: readonly KeptRow[];
	/** Which they are: "this set-up", "set-up 3". */
	words: string;
}

/** How long before the newest sweep another one ended, in bench seconds. */
export const ageS = (rows: readonly KeptRow[], index: number): number =>
	rows[rows.length - 1].clockS - rows[index].clockS;
