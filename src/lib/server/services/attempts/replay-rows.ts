import { setImmediate as yieldToOthers } from 'node:timers/promises';
import type { DrawnRows } from './drawn-rows';
import { preparedBench, rowClockOf, type SignalSource } from './prepared-bench';

/** How long the replay keeps everybody else waiting at a time, ms. */
const TURN_MS = 10;

/** Sweeps drawn rows again, oldest first: the very rows that were sent. Other work goes on in between. */
export async function* replayRows(
	source: SignalSource,
	stretches: DrawnRows[]
): AsyncGenerator<{ row: number; clockS: number; levelsDbm: Float32Array }> {
	let turnEnd = performance.now() + TURN_MS;
	for (const { setUp, fromRow, toRow } of stretches) {
		const { plan } = preparedBench(source, setUp.settings);
		const rows = rowClockOf(source.seed, plan, setUp);
		for (let row = fromRow; row <= toRow; row++) {
			if (performance.now() > turnEnd) {
				await yieldToOthers();
				turnEnd = performance.now() + TURN_MS;
			}
			yield { row, clockS: rows.endS(row), levelsDbm: plan.row(row, rows.startS(row)) };
		}
	}
}
