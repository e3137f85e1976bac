import { describe, expect, it } from 'vitest';
import { Answer } from '$lib/server/db/models/answer';
import { Attempt } from '$lib/server/db/models/attempt';
import { Finding } from '$lib/server/db/models/finding';
import { abandonAttempt } from '$lib/server/services/attempts/abandon-attempt';
import { getFinding } from '$lib/server/services/attempts/get-finding';
import { listSetUps } from '$lib/server/services/attempts/list-set-ups';
import { startAttempt } from '$lib/server/services/attempts/start-attempt';
import { setUpsResponse } from '$lib/schemas/set-up-log';
import { createAttempt, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');

describe('abandonAttempt(actor, attemptId, now)', () => {
	it('ends the attempt without answers; it counts as a try and has a finding', async () => {
		const { actor, attempt, slug } = await createAttempt();
		const { finding } = await abandonAttempt(actor, attempt.id, now);
		expect(finding.questions.map(({ verdict }) => verdict)).toEqual(['unanswered', 'unanswered']);
		expect(finding.passed).toBe(false);
		expect(await getFinding(actor, attempt.id)).toEqual({ finding });
		expect(await Answer.count({ where: { attemptId: attempt.id } })).toBe(0);
		const next = await startAttempt(actor, slug, now);
		expect(next.attempt).toMatchObject({ number: 2, triesLeft: 1 });
	});

	it('takes one of many that come at once, and none after', async () => {
		const { actor, attempt } = await createAttempt();
		const all = await Promise.allSettled(
			Array.from({ length: 6 }, () => abandonAttempt(actor, attempt.id, now))
		);
		expect(all.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
		await expect(abandonAttempt(actor, attempt.id, now)).rejects.toMatchObject({ code: 'conflict' });
	});

	it('leaves the tables unchanged when it fails late', async () => {
		const { actor, attempt } = await createAttempt();
		Attempt.addHook('afterUpdate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(abandonAttempt(actor, attempt.id, now)).rejects.toThrow('late');
		Attempt.removeHook('afterUpdate', 'fail late');
		expect(await Finding.count({ where: { attemptId: attempt.id } })).toBe(0);
		expect(await Attempt.findByPk(attempt.id)).toMatchObject({ closedAt: null });
	});

	it('is not there for anybody else', async () => {
		const { attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		await expect(abandonAttempt(stranger, attempt.id, now)).rejects.toMatchObject({ code: 'not_found' });
	});
});

describe('listSetUps(actor, attemptId)', () => {
	it('gives what was set, in words and as the receiver did it, with the rows drawn', async () => {
		const { actor, attempt } = await createAttempt();
		const settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };
		await sweep(actor, attempt.id, settings, { sweeps: 2 });
		await sweep(actor, attempt.id, { ...settings, rbwHz: 10e3 }, { from: 2, sweeps: 1 });
		const { setUps } = setUpsResponse.parse(await listSetUps(actor, attempt.id));
		expect(setUps).toMatchObject([
			{ number: 0, rows: { from: 0, to: 1 }, resolved: { rbwHz: 30e3 } },
			{ number: 1, rows: null, text: 'Resolution 10\u00a0kHz', resolved: { rbwHz: 10e3 } }
		]);
	});

	it('is not there for anybody else', async () => {
		const { attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		await expect(listSetUps(stranger, attempt.id)).rejects.toMatchObject({ code: 'not_found' });
	});
});
