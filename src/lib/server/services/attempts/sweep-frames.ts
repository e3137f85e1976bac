import { encodeFrame, type Frame } from '$lib/schemas/frames';
import type { StreamEnd, StreamEndReason, StreamState } from '$lib/schemas/sweep-stream';
import { advanceBench, type BenchPosition } from './advance-bench';
import type { OpenSweeps } from './open-sweeps';
import { Pace } from './pace';
import { reserveSweep } from './reserve-sweep';
import { rowClockOf } from './prepared-bench';
import type { RowClock } from './row-clock';
import { rowPieces, type RowPiece } from './row-pieces';
import { speedUpOf } from './speed-up';

/** Real time reserved at once, s: as long as a stream goes on unaware that it has been taken over. */
const SLICE_S = 0.15;
/** Real time that one piece of a long row covers at most, s. */
const PIECE_S = 0.05;

const END_MESSAGES: Record<StreamEndReason, string> = {
	done: 'The sweeps asked for are done.',
	'taken-over': 'The receiver was set up anew, here or on another page.',
	'input-protection': 'The input protection has tripped.',
	'bench-time-used': 'The receiver time of this exercise is used up.',
	closed: 'The attempt has been handed in.',
	'server-stopping': 'The server is being renewed.'
};

/** Aborts that end a stream: the reader has gone, or this process is going. */
export interface StreamSignals {
	gone: AbortSignal;
	stopping: AbortSignal;
}

/**
 * The frames of one stream, each when its bench time has passed. Pull them: whoever doesn't keeps the bench waiting.
 * @param sweeps rows to send at most
 */
export async function* sweepFrames(
	opened: OpenSweeps,
	sweeps: number,
	{ gone, stopping }: StreamSignals
): AsyncGenerator<Uint8Array<ArrayBuffer>> {
	const { setUp, bench, fromRow } = opened;
	const { plan, resolved } = bench;
	const rows = rowClockOf(bench.seed, plan, setUp);
	const speedUp = speedUpOf(resolved.sweepTimeS);
	const untilRow = fromRow + sweeps;
	const levelsOf = oneRow((row) => plan.row(row, rows.startS(row)));
	const pieceFrame = (piece: RowPiece, resent: boolean): Uint8Array<ArrayBuffer> =>
		encodeFrame(framed(piece, levelsOf(piece.row), resent, speedUp));
	let { position } = opened;
	const note = (type: 'state' | 'end', json: StreamState | StreamEnd) =>
		encodeFrame({ type, row: position.nextRow, clockS: position.clockS, speedUp, json });
	const ending = (reason: StreamEndReason) =>
		note('end', {
			reason,
			message: END_MESSAGES[reason],
			nextRow: position.nextRow,
			benchTimeUsedS: position.clockS
		});

	yield note('state', stateOf(opened, speedUp));
	if (opened.tripped) return yield ending('input-protection');
	for (const piece of piecesSwept(opened, rows, untilRow, SLICE_S * speedUp)) yield pieceFrame(piece, true);

	const signal = AbortSignal.any([gone, stopping]);
	const pace = new Pace(position.clockS, speedUp);
	while (!gone.aborted) {
		if (stopping.aborted) return yield ending('server-stopping');
		if (sweptUntil(position, untilRow)) return yield ending('done');
		if (position.clockS >= opened.benchTimeS) return yield ending('bench-time-used');
		const before: BenchPosition = position;
		const after = advanceBench(before, rows, SLICE_S * speedUp, untilRow);
		const over = await reserveSweep(opened.attemptId, opened.token, before, after);
		if (over) return yield ending(over);
		position = after;
		const row = before.clockS < before.rowEndS ? before.nextRow - 1 : before.nextRow;
		const span = { fromS: before.clockS, toS: after.clockS, row };
		for (const piece of rowPieces(span, rows, resolved, PIECE_S * speedUp)) {
			if (!(await paced(pace, piece.clockS, signal))) break;
			yield pieceFrame(piece, false);
		}
		await paced(pace, after.clockS, signal);
	}
}

/** What had been swept of this set-up from the row asked for on, before this stream began. */
function piecesSwept(
	{ position, fromRow, bench }: OpenSweeps,
	rows: RowClock,
	untilRow: number,
	pieceS: number
) {
	const toS = position.nextRow > untilRow ? rows.startS(untilRow) : position.clockS;
	return rowPieces({ fromS: rows.startS(fromRow), toS, row: fromRow }, rows, bench.resolved, pieceS);
}

/** Whether every row before `untilRow` has been swept to its end. */
const sweptUntil = ({ nextRow, clockS, rowEndS }: BenchPosition, untilRow: number): boolean =>
	nextRow > untilRow || (nextRow === untilRow && clockS >= rowEndS);

/** @returns false when the wait was cut short */
async function paced(pace: Pace, clockS: number, signal: AbortSignal): Promise<boolean> {
	try {
		await pace.until(clockS, signal);
		return true;
	} catch (cause) {
		if (!signal.aborted) throw cause;
		return false;
	}
}

function stateOf(opened: OpenSweeps, speedUp: number): StreamState {
	const { setUp, fromRow, flags, bench, position, benchTimeS } = opened;
	return {
		setUp: setUp.number,
		firstRow: setUp.firstRow,
		clockS: setUp.clockS,
		fromRow,
		restartRow: setUp.restartRow,
		resolved: bench.resolved,
		flags,
		sweepDurationS: bench.resolved.sweepTimeS,
		speedUp,
		benchTimeUsedS: position.clockS,
		benchTimeS
	};
}

/** A piece of a row as a frame. */
export function framed(piece: RowPiece, levelsDbm: Float32Array, resent: boolean, speedUp: number): Frame {
	const { row, fromPoint, toPoint, clockS } = piece;
	return {
		type: 'piece',
		row,
		fromPoint,
		points: levelsDbm.length,
		last: toPoint === levelsDbm.length,
		resent,
		clockS,
		speedUp,
		levelsDbm: levelsDbm.subarray(fromPoint, toPoint)
	};
}

/** `make`, remembering the last row: the pieces of one row come one after another. */
function oneRow(make: (row: number) => Float32Array): (row: number) => Float32Array {
	let held: { row: number; levelsDbm: Float32Array } | undefined;
	return (row) => {
		if (held?.row !== row) held = { row, levelsDbm: make(row) };
		return held.levelsDbm;
	};
}
