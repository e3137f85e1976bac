import { describe, expect, it } from 'vitest';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { Reading } from '$lib/server/db/models/reading';
import { SetUp } from '$lib/server/db/models/set-up';
import { countFrequency } from '$lib/server/bench/receiver/count';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { getAttemptView } from '$lib/server/services/attempts/get-attempt-view';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import { createAttempt, secretsOf, sweep } from '../../factories/attempt';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = {
	centreHz: 450.4e6,
	spanHz: 100e3,
	rbwHz: 3e3,
	points: 201,
	traces: [{ mode: 'max-hold' }]
};
/** A carrier that is always there, 400 kHz from the spread one. */
const carrierAt = { kind: 'cw', frequencyHz: 450.4e6, levelDbm: '=carrierDbm' };
const scene = {
	emitters: [
		{
			kind: 'digital',
			frequencyHz: 450e6,
			levelDbm: '=carrierDbm',
			symbolRateHz: '=rateHz',
			rollOff: 0.25,
			order: 4
		},
		carrierAt,
		{ ...carrierAt, frequencyHz: 451e6, when: { neighbour: 'carrier' } }
	],
	path: [{ frequencyHz: 450e6, lossDb: '=leadLossDb' }]
};
const request = { kind: 'count' as const, atHz: 450.4e6, gateS: 0.2 };
const stored = (id: number) => Attempt.findByPk(id, { rejectOnEmpty: true });

async function drawn() {
	const { actor, attempt } = await createAttempt({ scene });
	const swept = await sweep(actor, attempt.id, settings, { sweeps: 4 });
	await acknowledgeRows(actor, attempt.id, { row: 3 });
	const take = (over: Partial<typeof request> = {}) =>
		takeReading(actor, attempt.id, { request: { ...request, ...over } }, now);
	return { actor, attempt, swept, take };
}

describe('takeReading(actor, attemptId, { request: a count }, now)', () => {
	it('takes the number of the next row and the gate’s time on the bench clock, and keeps what the bench counts', async () => {
		const { attempt, take } = await drawn();
		const before = await stored(attempt.id);
		const { reading } = await take();
		const { seed, drawn: own } = await secretsOf(attempt.id);
		const resolved = resolveSettings(settings, own.profile);
		const { nextRow, clockS } = before;
		const expected = countFrequency(own.scene, own.profile, resolved, seed, request, nextRow, clockS);
		expect(reading).toMatchObject(expected);
		expect(reading).toMatchObject({ trace: null, mode: null, rows: { from: nextRow, to: nextRow }, request });
		const after = await stored(attempt.id);
		expect(after.nextRow).toBe(nextRow + 1);
		expect(after.clockS).toBeCloseTo(clockS + 0.2, 9);
		expect(await Reading.findByPk(reading.id)).toMatchObject({
			traceHash: null,
			clockS,
			value: reading.value
		});
	});

	it('counts anew each time: another row number, another chance', async () => {
		const { take } = await drawn();
		const [first, second] = [await take(), await take()];
		expect(second.reading.rows.from).toBe(first.reading.rows.from + 1);
		expect(second.reading.value).not.toBe(first.reading.value);
	});

	it('lets holds go on over it, with rows that are still the same when swept again', async () => {
		const { actor, attempt, swept, take } = await drawn();
		await take();
		const { bench } = await getAttemptView(actor, attempt.id);
		expect(bench).toMatchObject({ restartRow: 0, drawnTo: 3, resumeFrom: 5 });
		const more = await sweep(actor, attempt.id, settings, { from: 5, sweeps: 3 });
		await acknowledgeRows(actor, attempt.id, { row: 7 });
		const asked = { rows: { from: 0, to: 7 }, trace: 1, request: { kind: 'peak' as const } };
		const { reading } = await takeReading(actor, attempt.id, asked, now);
		const levels = [...swept.rows.values(), ...more.rows.values()].flatMap((row) => [...row]);
		expect(reading.count).toBe(7);
		expect(reading.value).toBeCloseTo(Math.max(...levels), 5);
		expect(
			(await SetUp.findAll({ where: { attemptId: attempt.id } })).map(({ firstRow }) => firstRow)
		).toEqual([0, 5]);
	});

	it('refuses where no line stands 20 dB over its surroundings, with the reason, and no time passes', async () => {
		const { attempt, take } = await drawn();
		const { nextRow, clockS } = await stored(attempt.id);
		const refused = take({ atHz: 450.2e6 });
		await expect(refused).rejects.toMatchObject({
			code: 'invalid',
			message: 'Nothing to count: no single line stands 20 dB above its surroundings here.',
			issues: [{ field: 'request' }]
		});
		expect(await stored(attempt.id)).toMatchObject({ nextRow, clockS });
		expect(await Reading.count({ where: { attemptId: attempt.id } })).toBe(0);
	});

	it.each([
		['a place the receiver does not reach', { atHz: 30e9 }, 'request.atHz'],
		['a gate that burns the receiver time left', { gateS: 400 }, 'request.gateS']
	])('refuses %s and names the field', async (_, over, field) => {
		const { take } = await drawn();
		await expect(take(over)).rejects.toMatchObject({ code: 'invalid', issues: [{ field }] });
	});

	it('counts nothing before the first sweep, nor while the input protection waits', async () => {
		const { actor, attempt } = await createAttempt({ scene });
		await expect(takeReading(actor, attempt.id, { request }, now)).rejects.toMatchObject({
			code: 'conflict'
		});
		await sweep(actor, attempt.id, settings, { sweeps: 1 });
		await Attempt.update({ protectionTripped: true }, { where: { id: attempt.id } });
		await expect(takeReading(actor, attempt.id, { request }, now)).rejects.toMatchObject({
			code: 'conflict'
		});
	});

	it('gives two that ask at once numbers of their own', async () => {
		const { take } = await drawn();
		const both = await Promise.all([take(), take()]);
		expect(new Set(both.map(({ reading }) => reading.rows.from)).size).toBe(2);
	});
});
