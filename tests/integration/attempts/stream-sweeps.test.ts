import { describe, expect, it } from 'vitest';
import { type PieceFrame } from '$lib/schemas/frames';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { SetUp } from '$lib/server/db/models/set-up';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { countStreams, endStreams } from '$lib/server/services/attempts/open-streams';
import { streamSweeps } from '$lib/server/services/attempts/stream-sweeps';
import { createAttempt, readStream, secretsOf, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };
const other: Settings = { ...settings, rbwHz: 100e3 };
const longOne: Settings = { ...settings, sweepTimeS: 1 };
const stored = (id: number) => Attempt.findByPk(id, { rejectOnEmpty: true });
const logOf = (attemptId: number) => SetUp.findAll({ where: { attemptId }, order: ['number'] });
const open = async (actor: Parameters<typeof streamSweeps>[0], id: number, set: Settings, from = 0) =>
	streamSweeps(actor, id, { settings: set, from }, now);

describe('streamSweeps(actor, attemptId, request, now)', () => {
	it('sends the rows that seed, row number, bench clock and settings give, and logs the set-up', async () => {
		const { actor, attempt } = await createAttempt();
		const { state, rows, end } = await sweep(actor, attempt.id, settings);
		const { drawn, seed } = await secretsOf(attempt.id);
		const plan = prepareSweep(drawn.scene, drawn.profile, resolveSettings(settings, drawn.profile), seed);
		let clockS = 0;
		for (let row = 0; row < 5; row++) {
			expect(rows.get(row)).toEqual(plan.row(row, clockS));
			clockS += plan.durationS(row);
		}
		expect(rows.size).toBe(5);
		expect(end).toMatchObject({ reason: 'done', nextRow: 5, benchTimeUsedS: clockS });
		expect(state).toMatchObject({ setUp: 0, firstRow: 0, fromRow: 0, restartRow: 0, clockS: 0, speedUp: 1 });
		expect(await logOf(attempt.id)).toMatchObject([{ settings, firstRow: 0, clockS: 0, drawnTo: null }]);
		expect(await stored(attempt.id)).toMatchObject({ nextRow: 5, clockS });
	});

	it('goes on with the same set-up where it stopped, as if it had never stopped', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings, { sweeps: 3 });
		const { state, rows } = await sweep(actor, attempt.id, settings, { from: 3, sweeps: 2 });
		const { drawn, seed } = await secretsOf(attempt.id);
		const plan = prepareSweep(drawn.scene, drawn.profile, resolveSettings(settings, drawn.profile), seed);
		let clockS = 0;
		for (let row = 0; row < 3; row++) clockS += plan.durationS(row);
		expect(rows.get(3)).toEqual(plan.row(3, clockS));
		expect(state).toMatchObject({ setUp: 0, fromRow: 3 });
		expect(await logOf(attempt.id)).toMatchObject([{ drawnTo: 2 }]);
	});

	it('sends rows again that were on their way when the line was cut, the same to the last bit', async () => {
		const { actor, attempt } = await createAttempt();
		const first = await sweep(actor, attempt.id, settings, { sweeps: 8 });
		const again = await sweep(actor, attempt.id, settings, { from: 4, sweeps: 8 });
		expect(again.pieces.filter(({ resent }) => resent).map(({ row }) => row)).toEqual([4, 5, 6, 7]);
		for (const row of [4, 5, 6, 7]) expect(again.rows.get(row)).toEqual(first.rows.get(row));
		expect([...again.rows.keys()]).toEqual([4, 5, 6, 7, 8, 9, 10, 11]);
	});

	it('begins a new set-up at the next row for any other settings, and never gives a number twice', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings, { sweeps: 8 });
		const { state, rows } = await sweep(actor, attempt.id, other, { from: 5, sweeps: 2 });
		expect(state).toMatchObject({ setUp: 1, firstRow: 8, fromRow: 8, restartRow: 8 });
		expect([...rows.keys()]).toEqual([8, 9]);
		expect(await logOf(attempt.id)).toMatchObject([
			{ firstRow: 0, endRow: 8, drawnTo: 4 },
			{ firstRow: 8, endRow: null, drawnTo: null }
		]);
	});

	it('keeps holds going over a change of traces or reference alone', async () => {
		const { actor, attempt } = await createAttempt();
		const fixed = { ...settings, attenuationDb: 10 };
		await sweep(actor, attempt.id, fixed, { sweeps: 3 });
		const held = await sweep(
			actor,
			attempt.id,
			{ ...fixed, referenceDbm: -20, traces: [{ mode: 'max-hold' }] },
			{ from: 3, sweeps: 3 }
		);
		expect(held.state).toMatchObject({ setUp: 1, firstRow: 3, restartRow: 0 });
		const wider = { ...fixed, spanHz: 2e6 };
		const restarted = await sweep(actor, attempt.id, wider, { from: 6, sweeps: 1 });
		expect(restarted.state.restartRow).toBe(6);
	});

	it('paces the rows to the bench clock', async () => {
		const { actor, attempt } = await createAttempt();
		const began = performance.now();
		const { end } = await sweep(actor, attempt.id, settings, { sweeps: 40 });
		const tookS = (performance.now() - began) / 1000;
		expect(end?.benchTimeUsedS).toBeGreaterThan(0.6);
		expect(tookS).toBeGreaterThan((end?.benchTimeUsedS ?? 0) - 0.05);
		expect(tookS).toBeLessThan((end?.benchTimeUsedS ?? 0) + 1.5);
	});

	it('lets a long sweep arrive in pieces, and speeds up what nobody would wait for by a stated factor', async () => {
		const { actor, attempt } = await createAttempt();
		const long = await sweep(actor, attempt.id, longOne, { sweeps: 1 });
		expect(long.pieces.length).toBeGreaterThan(10);
		expect(long.rows.size).toBe(1);
		expect(long.pieces.every(({ clockS }, i) => i === 0 || clockS > long.pieces[i - 1].clockS)).toBe(true);
		const veryLong = { ...settings, sweepTimeS: 200 };
		const began = performance.now();
		const stream = await open(actor, attempt.id, veryLong, 1);
		const { state, pieces } = await readStream(stream, (got) => got.length >= 5);
		expect(state.speedUp).toBe(50);
		expect(pieces[4].clockS - state.clockS).toBeGreaterThan(7.5);
		expect(performance.now() - began).toBeLessThan(2500);
	});

	it('ends a sweep that is under way when the set-up changes, and charges only the time that passed', async () => {
		const { actor, attempt } = await createAttempt();
		const stream = await open(actor, attempt.id, { ...settings, sweepTimeS: 4 });
		const { rows } = await readStream(stream, (got) => got.length >= 3);
		expect(rows.size).toBe(0);
		const next = await sweep(actor, attempt.id, settings, { from: 0, sweeps: 1 });
		expect(next.state.firstRow).toBe(1);
		expect(next.state.clockS).toBeGreaterThan(0.1);
		expect(next.state.clockS).toBeLessThan(1.5);
		expect(await logOf(attempt.id)).toMatchObject([{ endRow: 0, drawnTo: null }, { firstRow: 1 }]);
	});

	it('goes on with a long sweep that was cut off, from its first point', async () => {
		const { actor, attempt } = await createAttempt();
		const cut = await readStream(await open(actor, attempt.id, longOne), (got) => got.length >= 4);
		const whole = await sweep(actor, attempt.id, longOne, { sweeps: 1 });
		const [{ row, fromPoint, resent }] = whole.pieces;
		expect({ row, fromPoint, resent }).toEqual({ row: 0, fromPoint: 0, resent: true });
		expect(whole.rows.get(0)?.subarray(0, 8)).toEqual(wholeStart(cut.pieces).subarray(0, 8));
		expect(await stored(attempt.id)).toMatchObject({ nextRow: 1 });
	});

	it('ends with a reason when another stream takes the receiver', async () => {
		const { actor, attempt } = await createAttempt();
		const first = readStream(await open(actor, attempt.id, settings));
		await new Promise((resume) => setTimeout(resume, 200));
		const { nextRow } = await stored(attempt.id);
		await sweep(actor, attempt.id, other, { from: nextRow, sweeps: 2 });
		expect((await first).end?.reason).toBe('taken-over');
	});

	it('cannot be forked: of tabs that sweep at once with different settings, no two get the same row', async () => {
		const { actor, attempt } = await createAttempt();
		const tabs = await Promise.all(
			[10e3, 30e3, 100e3, 300e3].map(async (rbwHz) => {
				const stream = await streamSweeps(
					actor,
					attempt.id,
					{ settings: { ...settings, rbwHz }, from: 0, sweeps: 30 },
					now
				);
				return readStream(stream);
			})
		);
		const seen = tabs.flatMap(({ rows }) => [...rows.keys()]);
		expect(new Set(seen).size).toBe(seen.length);
		expect(tabs.filter(({ end }) => end?.reason === 'done')).toHaveLength(1);
		expect(tabs.filter(({ end }) => end?.reason === 'taken-over')).toHaveLength(3);
		const { nextRow } = await stored(attempt.id);
		expect(Math.max(...seen)).toBeLessThan(nextRow);
	});

	it('waits for a reader that does not read: no bench time passes meanwhile', async () => {
		const { actor, attempt } = await createAttempt();
		const stream = await open(actor, attempt.id, settings);
		await new Promise((resume) => setTimeout(resume, 700));
		expect((await stored(attempt.id)).clockS).toBeLessThan(0.4);
		await stream.cancel();
	});

	it('stops when the reader goes, and leaves nothing running', async () => {
		const { actor, attempt } = await createAttempt();
		const before = countStreams();
		const stream = await open(actor, attempt.id, { ...settings, sweepTimeS: 4 });
		await readStream(stream, (got) => got.length >= 1);
		expect(countStreams()).toBe(before);
		const { clockS } = await stored(attempt.id);
		await new Promise((resume) => setTimeout(resume, 400));
		expect((await stored(attempt.id)).clockS).toBe(clockS);
	});

	it('ends when the process is about to, so that the page can ask another', async () => {
		const { actor, attempt } = await createAttempt();
		const swept = readStream(await open(actor, attempt.id, settings));
		setTimeout(endStreams, 150);
		expect((await swept).end?.reason).toBe('server-stopping');
		expect(countStreams()).toBe(0);
	});

	it('ends when the receiver time is used up, and sweeps no more', async () => {
		const { actor, attempt } = await createAttempt({ benchTimeS: 0.3 });
		const used = await readStream(await open(actor, attempt.id, settings));
		expect(used.end?.reason).toBe('bench-time-used');
		expect(used.end?.benchTimeUsedS).toBeLessThan(0.6);
		const again = await sweep(actor, attempt.id, settings, { from: used.end?.nextRow });
		expect(again.rows.size).toBe(0);
		expect(again.end?.reason).toBe('bench-time-used');
	});

	it('ends when the attempt is closed, and is refused afterwards', async () => {
		const { actor, attempt } = await createAttempt();
		const swept = readStream(await open(actor, attempt.id, settings));
		await Attempt.update({ closedAt: now }, { where: { id: attempt.id } });
		expect((await swept).end?.reason).toBe('closed');
		await expect(open(actor, attempt.id, settings)).rejects.toMatchObject({ code: 'conflict' });
	});

	it('refuses settings by name and logs nothing', async () => {
		const { actor, attempt } = await createAttempt();
		await expect(open(actor, attempt.id, { ...settings, rbwHz: 31e3 })).rejects.toMatchObject({
			code: 'invalid',
			issues: [{ field: 'settings.rbwHz' }]
		});
		await expect(open(actor, attempt.id, { ...settings, startHz: 1e6 })).rejects.toMatchObject({
			code: 'invalid'
		});
		expect(await logOf(attempt.id)).toEqual([]);
		expect(await stored(attempt.id)).toMatchObject({ streamToken: null, nextRow: 0 });
	});

	it('refuses one sweep that would use up most of the receiver time left, and logs nothing', async () => {
		const { actor, attempt } = await createAttempt();
		await expect(open(actor, attempt.id, { ...settings, sweepTimeS: 1000 })).rejects.toMatchObject({
			code: 'invalid',
			issues: [
				{ field: 'settings.sweepTimeS', message: expect.stringContaining('receiver time left') as string }
			]
		});
		expect(await logOf(attempt.id)).toEqual([]);
	});

	it('refuses a row that is yet to come, and says which is next', async () => {
		const { actor, attempt } = await createAttempt();
		await expect(open(actor, attempt.id, settings, 3)).rejects.toMatchObject({
			code: 'conflict',
			details: { nextRow: 0 }
		});
	});

	it('leaves the tables unchanged when it fails late', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings, { sweeps: 2 });
		const before = await stored(attempt.id);
		Attempt.addHook('afterUpdate', 'fail late', (changed) => {
			if ((changed as Attempt).streamToken !== before.streamToken) throw new Error('late');
		});
		await expect(open(actor, attempt.id, other, 2)).rejects.toThrow('late');
		Attempt.removeHook('afterUpdate', 'fail late');
		expect(await logOf(attempt.id)).toMatchObject([{ number: 0, endRow: null, drawnTo: null }]);
		expect((await stored(attempt.id)).get()).toEqual(before.get());
	});

	it('is not there for anybody else', async () => {
		const { attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		await expect(open(stranger, attempt.id, settings)).rejects.toMatchObject({ code: 'not_found' });
		await expect(open(stranger, 999_999_999, settings)).rejects.toMatchObject({
			code: 'not_found',
			message: 'There is no such attempt.'
		});
	});
});

/** The points that had come of a row cut short. */
const wholeStart = (pieces: PieceFrame[]): Float32Array =>
	Float32Array.from(pieces.flatMap(({ levelsDbm }) => [...levelsDbm]));
