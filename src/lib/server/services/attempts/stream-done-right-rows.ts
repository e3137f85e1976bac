import { setImmediate as yieldToOthers } from 'node:timers/promises';
import { encodeFrame } from '$lib/schemas/frames';
import type { Settings } from '$lib/schemas/settings';
import type { PlayedExercise } from '$lib/server/bench/grading/done-right';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { doneRightOf } from './done-right-of';
import { preparedBench, type SignalSource } from './prepared-bench';
import { pulledStream } from './pulled-stream';
import { RowClock } from './row-clock';
import { framed } from './sweep-frames';

/**
 * The rows on show after one step of the taught method: those its traces hold, or, where nothing has been swept yet with
 * its set-up, the sweep that would come next.
 * @throws DomainError `invalid` naming `step` when the method has no such step
 */
export async function streamDoneRightRows(
	actor: Actor,
	attemptId: number,
	step: number
): Promise<ReadableStream<Uint8Array>> {
	const { source, play } = await doneRightOf(actor, attemptId);
	if (!(step in play.states)) {
		const message = `must be a step of the method: it has ${play.states.length}, from 0`;
		throw new DomainError('invalid', 'There is no such step.', { issues: [{ field: 'step', message }] });
	}
	return pulledStream(
		() => rowFrames(source, stretchesOf(source, play, step)),
		() => {}
	);
}

interface Stretch {
	settings: Settings;
	from: number;
	to: number;
	firstRow: number;
	/** Bench clock when `firstRow` began, s. */
	clockS: number;
}

function stretchesOf(source: SignalSource, { states, log }: PlayedExercise, step: number): Stretch[] {
	const { rows, settings, nextRow } = states[step];
	if (!rows) {
		const last = log.findLast(({ firstRow, sweeps }) => firstRow + sweeps === nextRow);
		const clockS = last ? clockOf(source, last).startS(nextRow) : 0;
		return [{ settings, from: nextRow, to: nextRow, firstRow: nextRow, clockS }];
	}
	return log.flatMap((entry) => {
		const from = Math.max(rows.from, entry.firstRow);
		const to = Math.min(rows.to, entry.firstRow + entry.sweeps - 1);
		return from <= to ? [{ ...entry, from, to }] : [];
	});
}

type Swept = Pick<Stretch, 'settings' | 'firstRow' | 'clockS'>;

function clockOf(source: SignalSource, { settings, firstRow, clockS }: Swept): RowClock {
	const { plan } = preparedBench(source, settings);
	return new RowClock((row) => plan.durationS(row), firstRow, clockS);
}

async function* rowFrames(source: SignalSource, stretches: Stretch[]): AsyncGenerator<Uint8Array> {
	for (const stretch of stretches) {
		const { plan } = preparedBench(source, stretch.settings);
		const rows = clockOf(source, stretch);
		for (let row = stretch.from; row <= stretch.to; row++) {
			await yieldToOthers();
			const levelsDbm = plan.row(row, rows.startS(row));
			const piece = { row, fromPoint: 0, toPoint: levelsDbm.length, clockS: rows.endS(row) };
			yield encodeFrame(framed(piece, levelsDbm, true, 1));
		}
	}
}
