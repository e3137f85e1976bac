import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { combineRows } from '$lib/measure/combine-rows';
import { takeReading as readOff } from '$lib/measure/take-reading';
import type { TakeReadingRequest } from '$lib/schemas/attempt';
import type { ReadingRequest } from '$lib/schemas/reading';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { Reading } from '$lib/server/db/models/reading';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { field } from '$lib/server/bench/receiver/profiles';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import { createAttempt, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = {
	centreHz: 450e6,
	spanHz: 1e6,
	rbwHz: 30e3,
	points: 201,
	attenuationDb: 10,
	detector: 'average',
	scale: 'power',
	traces: [{ mode: 'live' }, { mode: 'average', count: 4 }, { mode: 'max-hold' }, { mode: 'kept' }]
};
const request: ReadingRequest = { kind: 'channel-power', centreHz: 450e6, widthHz: 200e3 };
const readingsOf = (attemptId: number) => Reading.findAll({ where: { attemptId } });

/** Somebody's attempt with rows 0…9 drawn. */
async function drawn() {
	const { actor, attempt } = await createAttempt();
	const swept = await sweep(actor, attempt.id, settings, { sweeps: 10 });
	await acknowledgeRows(actor, attempt.id, { row: 9 });
	const take = (over: Partial<TakeReadingRequest> = {}) =>
		takeReading(actor, attempt.id, { rows: { from: 0, to: 9 }, trace: 2, request, ...over }, now);
	return { actor, attempt, swept, take };
}

describe('takeReading(actor, attemptId, request, now)', () => {
	it.each([
		[1, 'live', 9, 1],
		[2, 'average', 6, 4],
		[3, 'max-hold', 0, 10]
	] as const)(
		'trace %i, %s: takes what the page computes from the same rows',
		async (trace, mode, from, count) => {
			const { swept, take } = await drawn();
			const { reading } = await take({ trace });
			const rows = [...swept.rows.values()];
			const resolved = resolveSettings(settings, field);
			const levelsDbm = combineRows(rows, mode, 4, 'power');
			const { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb } = resolved;
			const setUp = { startHz, stopHz, rbwHz, vbwHz, sweepTimeS, detector, scale, correctionDb };
			const expected = readOff({ ...setUp, mode, count, levelsDbm }, request);
			expect(reading).toMatchObject(expected);
			expect(reading).toMatchObject({ rows: { from, to: 9 }, trace, mode, count, setUp: 0, request });
		}
	);

	it('keeps its own value with a hash of the trace, the same every time', async () => {
		const { attempt, take } = await drawn();
		await take();
		await take();
		await take({ rows: { from: 0, to: 8 } });
		const [first, again, other] = await readingsOf(attempt.id);
		expect(first.traceHash).toMatch(/^[0-9a-f]{64}$/);
		expect(again.traceHash).toBe(first.traceHash);
		expect(again.value).toBe(first.value);
		expect(other.traceHash).not.toBe(first.traceHash);
		expect(first.engineVersion).toBe((await Attempt.findByPk(attempt.id))?.engineVersion);
	});

	it('folds a long hold as it goes, to the same trace', async () => {
		const { actor, attempt } = await createAttempt();
		const swept = await sweep(actor, attempt.id, settings, { sweeps: 150 });
		await acknowledgeRows(actor, attempt.id, { row: 149 });
		const asked = { rows: { from: 0, to: 149 }, trace: 3, request: { kind: 'peak' as const } };
		const { reading } = await takeReading(actor, attempt.id, asked, now);
		const levelsDbm = combineRows([...swept.rows.values()], 'max-hold', 1, 'power');
		expect(reading.count).toBe(150);
		const [{ traceHash }] = await readingsOf(attempt.id);
		expect(traceHash).toBe(createHash('sha256').update(new Uint8Array(levelsDbm.buffer)).digest('hex'));
	});

	it('refuses an average too great to be swept again, and says so', async () => {
		const { actor, attempt } = await createAttempt();
		const great = { ...settings, points: 10_001, traces: [{ mode: 'average' as const, count: 10_000 }] };
		await sweep(actor, attempt.id, great, { sweeps: 1 });
		await Attempt.update({ nextRow: 5000, clockS: 500, rowEndS: 500 }, { where: { id: attempt.id } });
		await acknowledgeRows(actor, attempt.id, { row: 4000 });
		const asked = { rows: { from: 0, to: 4000 }, trace: 1, request };
		await expect(takeReading(actor, attempt.id, asked, now)).rejects.toMatchObject({
			issues: [{ field: 'rows' }]
		});
	});

	it('goes over set-ups that differ in traces alone, leaving out what nobody drew', async () => {
		const { actor, attempt, swept } = await drawn();
		const held = { ...settings, traces: [{ mode: 'max-hold' as const }] };
		const more = await sweep(actor, attempt.id, held, { from: 8, sweeps: 5 });
		await acknowledgeRows(actor, attempt.id, { row: 14 });
		const { reading } = await takeReading(
			actor,
			attempt.id,
			{ rows: { from: 5, to: 14 }, trace: 1, request: { kind: 'peak' } },
			now
		);
		const rows = [...swept.rows, ...more.rows].filter(([row]) => row >= 5).map(([, levels]) => levels);
		expect(more.state.restartRow).toBe(0);
		expect(reading.value).toBeCloseTo(Math.max(...combineRows(rows, 'max-hold', 1, 'power')), 6);
		expect(reading.count).toBe(10);
	});

	const refusals: [string, Partial<TakeReadingRequest>, string][] = [
		['rows that were never drawn', { rows: { from: 5, to: 10 } }, 'rows.to'],
		['rows that were never swept', { rows: { from: 5, to: 4000 } }, 'rows.to'],
		['a trace that is not there', { trace: 5 }, 'trace'],
		['a kept trace by rows of its keeping', { trace: 4 }, 'trace'],
		[
			'a reading that has no number',
			{ request: { kind: 'channel-power', centreHz: 900e6, widthHz: 2e5 } },
			'request'
		]
	];
	it.each(refusals)('refuses %s, with the reason, and keeps nothing', async (_, over, fieldName) => {
		const { attempt, take } = await drawn();
		const refused = take(over);
		await expect(refused).rejects.toMatchObject({ code: 'invalid', issues: [{ field: fieldName }] });
		await expect(refused).rejects.toMatchObject({ message: expect.stringMatching(/\w{3}.*\w/) as string });
		expect(await readingsOf(attempt.id)).toEqual([]);
	});

	it('refuses rows from before holds and averages started again', async () => {
		const { actor, attempt } = await drawn();
		await sweep(actor, attempt.id, { ...settings, rbwHz: 10e3 }, { from: 10, sweeps: 3 });
		await acknowledgeRows(actor, attempt.id, { row: 12 });
		const rows = { from: 8, to: 12 };
		await expect(takeReading(actor, attempt.id, { rows, trace: 3, request }, now)).rejects.toMatchObject({
			issues: [{ field: 'rows.from' }]
		});
	});

	it('comes too late once the attempt is closed', async () => {
		const { attempt, take } = await drawn();
		await Attempt.update({ closedAt: now }, { where: { id: attempt.id } });
		await expect(take()).rejects.toMatchObject({ code: 'conflict' });
		expect(await readingsOf(attempt.id)).toEqual([]);
	});

	it('refuses to replay what an earlier engine swept', async () => {
		const { attempt, take } = await drawn();
		await Attempt.update({ engineVersion: 0 }, { where: { id: attempt.id } });
		await expect(take()).rejects.toMatchObject({ code: 'conflict' });
	});

	it('leaves the tables unchanged when it fails late', async () => {
		const { attempt, take } = await drawn();
		Reading.addHook('afterCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(take()).rejects.toThrow('late');
		Reading.removeHook('afterCreate', 'fail late');
		expect(await readingsOf(attempt.id)).toEqual([]);
	});

	it('is not there for anybody else', async () => {
		const { attempt } = await drawn();
		const { actor: stranger } = await createUser('apprentice');
		const asked = { rows: { from: 0, to: 9 }, trace: 1, request };
		await expect(takeReading(stranger, attempt.id, asked, now)).rejects.toMatchObject({ code: 'not_found' });
	});
});
