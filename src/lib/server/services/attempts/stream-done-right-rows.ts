import { setImmediate as yieldToOthers } from 'node:timers/promises';
import { encodeFrame } from '$lib/schemas/frames';
import type { PlayedExercise } from '$lib/server/bench/grading/done-right';
import type { Actor } from '$lib/server/domain/role';
import { doneRightOf } from './done-right-of';
import { preparedBench, type SignalSource } from './prepared-bench';
import { pulledStream } from './pulled-stream';
import { RowClock } from './row-clock';
import { framed } from './sweep-frames';

/** The rows that the taught method sweeps on a closed attempt's own signal; those outside its log are left out. */
export async function streamDoneRightRows(
	actor: Actor,
	attemptId: number,
	rows: { from: number; to: number }
): Promise<ReadableStream<Uint8Array>> {
	const { source, play } = await doneRightOf(actor, attemptId);
	return pulledStream(
		() => rowFrames(source, play.log, rows),
		() => {}
	);
}

async function* rowFrames(
	source: SignalSource,
	log: PlayedExercise['log'],
	{ from, to }: { from: number; to: number }
): AsyncGenerator<Uint8Array> {
	for (const { settings, firstRow, sweeps, clockS } of log) {
		const last = Math.min(to, firstRow + sweeps - 1);
		if (last < Math.max(from, firstRow)) continue;
		const { plan } = preparedBench(source, settings);
		const rows = new RowClock((row) => plan.durationS(row), firstRow, clockS);
		for (let row = Math.max(from, firstRow); row <= last; row++) {
			await yieldToOthers();
			const levelsDbm = plan.row(row, rows.startS(row));
			const piece = { row, fromPoint: 0, toPoint: levelsDbm.length, clockS: rows.endS(row) };
			yield encodeFrame(framed(piece, levelsDbm, true, 1));
		}
	}
}
