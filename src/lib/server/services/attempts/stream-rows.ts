import { encodeFrame } from '$lib/schemas/frames';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { countRows, drawnRows, type DrawnRows } from './drawn-rows';
import { getAttempt } from './get-attempt';
import type { SignalSource } from './prepared-bench';
import { pulledStream } from './pulled-stream';
import { replayRows } from './replay-rows';
import { setUpLog } from './set-up-log';
import { exerciseOf, signalSource } from './signal-source';
import { framed } from './sweep-frames';

/** Enough for the longest average; whoever wants more asks again. */
const MOST_ROWS = 10_000;

/**
 * Rows that were drawn before, at once and free of receiver time: for a page opened again, and for playing back.
 * Rows in the range that nobody drew are left out.
 */
export async function streamRows(
	actor: Actor,
	attemptId: number,
	rows: { from: number; to: number }
): Promise<ReadableStream<Uint8Array>> {
	const attempt = await getAttempt(actor, 'attempt.read', attemptId);
	const source = signalSource(attempt, await exerciseOf(attempt));
	const stretches = drawnRows(await setUpLog(attemptId), rows.from, rows.to);
	if (countRows(stretches) > MOST_ROWS) {
		const message = `must not span more than ${MOST_ROWS} rows`;
		throw new DomainError('invalid', 'Too many rows at once.', { issues: [{ field: 'to', message }] });
	}
	return pulledStream(
		() => rowFrames(source, stretches),
		() => {}
	);
}

async function* rowFrames(source: SignalSource, stretches: DrawnRows[]): AsyncGenerator<Uint8Array> {
	for await (const { row, clockS, levelsDbm } of replayRows(source, stretches)) {
		yield encodeFrame(framed({ row, fromPoint: 0, toPoint: levelsDbm.length, clockS }, levelsDbm, true, 1));
	}
}
