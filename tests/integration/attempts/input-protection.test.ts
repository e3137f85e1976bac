import { describe, expect, it } from 'vitest';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { streamSweeps } from '$lib/server/services/attempts/stream-sweeps';
import { createAttempt, sweep } from '../../factories/attempt';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };
const stored = (id: number) => Attempt.findByPk(id, { rejectOnEmpty: true });
const open = async (actor: Parameters<typeof streamSweeps>[0], id: number, set: Settings, from = 0) =>
	streamSweeps(actor, id, { settings: set, from }, now);

describe('input protection', () => {
	const hot = { parameters: hotParameters() };

	it('trips, is kept with the attempt, and needs a pad and a reset', async () => {
		const { actor, attempt } = await createAttempt(hot);
		const bare = { ...settings, referenceDbm: 20 };
		const tripped = await sweep(actor, attempt.id, bare);
		expect(tripped.rows.size).toBe(0);
		expect(tripped.end?.reason).toBe('input-protection');
		expect(tripped.state.flags).toContainEqual({ kind: 'input-protection' });
		expect(await stored(attempt.id)).toMatchObject({
			protectionTripped: true,
			protectionTrips: 1,
			clockS: 0
		});
		await expect(open(actor, attempt.id, bare)).rejects.toMatchObject({ code: 'conflict' });
		const padded = { ...bare, input: { padDb: 30 as const } };
		const waiting = await sweep(actor, attempt.id, padded);
		expect(waiting).toMatchObject({
			state: { resolved: { input: { padDb: 30 } } },
			end: { reason: 'input-protection' }
		});
		expect(await stored(attempt.id)).toMatchObject({
			protectionTripped: true,
			protectionTrips: 1,
			clockS: 0
		});
		const again = await sweep(actor, attempt.id, bare, { resetProtection: true });
		expect(again.end?.reason).toBe('input-protection');
		const safe = await sweep(actor, attempt.id, padded, { resetProtection: true, sweeps: 2 });
		expect([...safe.rows.keys()]).toEqual([0, 1]);
		expect(await stored(attempt.id)).toMatchObject({ protectionTripped: false, protectionTrips: 2 });
	});
});

it('a bench clock stands in the database to its last bit', async () => {
	const { attempt } = await createAttempt();
	for (const clockS of [0.1 + 0.2, 1 / 3, 12345.678901234567, 5e-324, 1e15 / 7]) {
		await Attempt.update({ clockS }, { where: { id: attempt.id } });
		expect((await stored(attempt.id)).clockS).toBe(clockS);
	}
});

function hotParameters() {
	return {
		carrierDbm: { draw: 'uniform', from: 34, to: 35 },
		leadLossDb: { draw: 'step', from: 1, to: 2, step: 0.1 },
		rateHz: { draw: 'uniform', from: 90e3, to: 110e3 },
		neighbour: { draw: 'choice', of: ['none', 'carrier'] }
	};
}
