import type { Sweeper, SweepWith } from '../exercise/bench-session';

/**
 * The same receiver, asked once for each row: a row is decided by scene, settings, seed, number and clock, so methods
 * that sweep alike share rows. For one seed and one scene; let go of it with them.
 */
export function memoSweeps(sweepWith: SweepWith): SweepWith {
	const sweepers = new Map<string, Sweeper>();
	return (scene, profile, resolved, seed) => {
		// What a trace keeps and where the reference stands change nothing in a row.
		const { traces: _, referenceDbm: __, ...swept } = resolved;
		const key = JSON.stringify(swept);
		const known = sweepers.get(key);
		if (known) return known;
		const sweeper = memoRows(sweepWith(scene, profile, resolved, seed));
		sweepers.set(key, sweeper);
		return sweeper;
	};
}

function memoRows(sweeper: Sweeper): Sweeper {
	const rows = new Map<string, ArrayLike<number>>();
	const durations = new Map<number, number>();
	return {
		durationS(n) {
			const durationS = durations.get(n) ?? sweeper.durationS(n);
			durations.set(n, durationS);
			return durationS;
		},
		row(n, clockS) {
			const key = `${n} ${clockS}`;
			const row = rows.get(key) ?? sweeper.row(n, clockS);
			rows.set(key, row);
			return row;
		}
	};
}
