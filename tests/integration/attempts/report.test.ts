import { describe, expect, it } from 'vitest';
import { reportView } from '$lib/schemas/report';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import type { Actor } from '$lib/server/domain/role';
import { abandonAttempt } from '$lib/server/services/attempts/abandon-attempt';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { getReport } from '$lib/server/services/attempts/get-report';
import { handIn } from '$lib/server/services/attempts/hand-in';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import { createAttempt, secretsOf, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = {
	...{ centreHz: 450e6, spanHz: 1e6, rbwHz: 10e3, points: 501 },
	...{ detector: 'average', scale: 'power', traces: [{ mode: 'average', count: 8 }, { mode: 'live' }] }
};

/** An attempt with one answer resting on a reading, and another set-up swept after it. */
async function createMeasured() {
	const { actor, attempt } = await createAttempt();
	const swept = await sweep(actor, attempt.id, settings, { sweeps: 8 });
	await acknowledgeRows(actor, attempt.id, { row: 7 });
	const request = { kind: 'channel-power' as const, centreHz: 450e6, widthHz: 200e3 };
	const { reading } = await takeReading(
		actor,
		attempt.id,
		{ rows: { from: 0, to: 7 }, trace: 1, request },
		now
	);
	await sweep(actor, attempt.id, { ...settings, rbwHz: 30e3 }, { from: 8, sweeps: 1 });
	const power = {
		type: 'number' as const,
		text: reading.value.toFixed(1),
		unit: 'dBm',
		readingId: reading.id
	};
	await handIn(actor, attempt.id, { answers: { power } }, now);
	return { actor, attempt, reading, swept };
}

describe('getReport(actor, attemptId)', () => {
	it('shows the set-up, the traces and the reading that the answer rests on, with its verdict', async () => {
		const { actor, attempt, reading, swept } = await createMeasured();
		const report = reportView.parse(await getReport(actor, attempt.id));
		expect(report.setUp).toMatchObject({ rbwHz: 10e3, points: 501 });
		expect(report.picture?.row).toBe(7);
		expect(report.picture?.traces.map(({ mode }) => mode)).toEqual(['average', 'live']);
		expect(report.picture?.traces[1].levelsDbm[250]).toBeCloseTo(swept.rows.get(7)![250], 2);
		expect(report.picture?.marks).toEqual([
			expect.objectContaining({ readingId: reading.id, mark: { startHz: 449.9e6, stopHz: 450.1e6 } })
		]);
		expect(report.answers).toMatchObject([
			{ id: 'power', verdict: 'wrong', readingId: reading.id },
			{ id: 'width', verdict: 'unanswered', yours: null }
		]);
		expect(report).toMatchObject({ passed: false, closedAt: now.toISOString() });
	});

	it('tells nothing of the signal but what was measured', async () => {
		const { actor, attempt } = await createMeasured();
		const { marks } = await secretsOf(attempt.id);
		const text = JSON.stringify(await getReport(actor, attempt.id));
		expect(marks.filter((mark) => text.includes(mark))).toEqual([]);
	});

	it('is there for an attempt in which nothing was swept, and for one of an earlier engine, without a picture', async () => {
		const { actor, attempt } = await createAttempt();
		await abandonAttempt(actor, attempt.id, now);
		expect(await getReport(actor, attempt.id)).toMatchObject({ setUp: null, picture: null, readings: [] });
		const old = await createMeasured();
		await Attempt.update({ engineVersion: 0 }, { where: { id: old.attempt.id } });
		expect(await getReport(old.actor, old.attempt.id)).toMatchObject({
			setUp: { rbwHz: 10e3 },
			picture: null
		});
	});

	it('is refused while the attempt is open, and isn’t there for strangers', async () => {
		const { actor, attempt } = await createAttempt();
		await expect(getReport(actor, attempt.id)).rejects.toMatchObject({ code: 'conflict' });
		await abandonAttempt(actor, attempt.id, now);
		const { actor: stranger } = await createUser('instructor');
		await expect(getReport(stranger, attempt.id)).rejects.toMatchObject({ code: 'not_found' });
		const administrator: Actor = { id: stranger.id, roles: ['administrator'] };
		expect((await getReport(administrator, attempt.id)).attemptId).toBe(attempt.id);
	});
});
