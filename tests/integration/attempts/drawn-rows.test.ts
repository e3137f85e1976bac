import { describe, expect, it } from 'vitest';
import { FrameDecoder, type PieceFrame } from '$lib/schemas/frames';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { streamRows } from '$lib/server/services/attempts/stream-rows';
import { streamSweeps } from '$lib/server/services/attempts/stream-sweeps';
import { createAttempt, readStream, sweep, wholeRows } from '../../factories/attempt';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };
const other: Settings = { ...settings, rbwHz: 100e3 };
const longOne: Settings = { ...settings, sweepTimeS: 1 };
const stored = (id: number) => Attempt.findByPk(id, { rejectOnEmpty: true });
const open = async (actor: Parameters<typeof streamSweeps>[0], id: number, set: Settings, from = 0) =>
	streamSweeps(actor, id, { settings: set, from }, now);

describe('acknowledgeRows(actor, attemptId, {row})', () => {
	it('marks a row and the earlier ones of its set-up as drawn, and takes nothing back', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings, { sweeps: 6 });
		expect(await acknowledgeRows(actor, attempt.id, { row: 4 })).toEqual({ drawnTo: 4 });
		expect(await acknowledgeRows(actor, attempt.id, { row: 2 })).toEqual({ drawnTo: 4 });
	});

	it('refuses rows that were not swept, or not to their end', async () => {
		const { actor, attempt } = await createAttempt();
		const refused = (row: number) =>
			expect(acknowledgeRows(actor, attempt.id, { row })).rejects.toMatchObject({
				code: 'invalid',
				issues: [{ field: 'row' }]
			});
		await refused(0);
		await readStream(await open(actor, attempt.id, longOne), (got) => got.length >= 3);
		await refused(0);
		await sweep(actor, attempt.id, settings, { sweeps: 1 });
		await refused(0);
		expect(await acknowledgeRows(actor, attempt.id, { row: 1 })).toEqual({ drawnTo: 1 });
	});
});

describe('streamRows(actor, attemptId, {from, to})', () => {
	it('gives the drawn rows again at once, over set-ups, and none that nobody drew', async () => {
		const { actor, attempt } = await createAttempt();
		const first = await sweep(actor, attempt.id, settings, { sweeps: 8 });
		const second = await sweep(actor, attempt.id, other, { from: 5, sweeps: 3 });
		await acknowledgeRows(actor, attempt.id, { row: 9 });
		const { clockS } = await stored(attempt.id);
		const { pieces } = await readRows(await streamRows(actor, attempt.id, { from: 2, to: 99 }));
		const rows = wholeRows(pieces);
		expect([...rows.keys()]).toEqual([2, 3, 4, 8, 9]);
		expect(rows.get(3)).toEqual(first.rows.get(3));
		expect(rows.get(9)).toEqual(second.rows.get(9));
		expect((await stored(attempt.id)).clockS).toBe(clockS);
	});
});

/** A stream of rows alone, without state or end. */
async function readRows(stream: ReadableStream<Uint8Array>): Promise<{ pieces: PieceFrame[] }> {
	const decoder = new FrameDecoder();
	const pieces: PieceFrame[] = [];
	for await (const chunk of stream) {
		for (const frame of decoder.push(chunk)) if (frame.type === 'piece') pieces.push(frame);
	}
	return { pieces };
}
