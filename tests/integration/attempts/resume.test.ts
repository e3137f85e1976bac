import { describe, expect, it } from 'vitest';
import { attemptView } from '$lib/schemas/attempt';
import type { Markings } from '$lib/schemas/markings';
import type { Settings } from '$lib/schemas/settings';
import { Attempt } from '$lib/server/db/models/attempt';
import { Draft } from '$lib/server/db/models/draft';
import { acknowledgeRows } from '$lib/server/services/attempts/acknowledge-rows';
import { getAttemptView } from '$lib/server/services/attempts/get-attempt-view';
import { revealHint } from '$lib/server/services/attempts/reveal-hint';
import { saveMarkings } from '$lib/server/services/attempts/save-markings';
import { saveDrafts } from '$lib/server/services/attempts/save-drafts';
import { takeReading } from '$lib/server/services/attempts/take-reading';
import { createAttempt, secretsOf, sweep } from '../../factories/attempt';
import { createUser } from '../../factories/user';

const now = new Date('2026-03-02T10:00:00Z');
const settings: Settings = { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 };
const markings: Markings = {
	markers: [
		{ letter: 'A', at: 0, trace: 1, follows: 'peak' },
		{ letter: 'C', at: 450.0125e6, trace: 1, from: 'A' }
	],
	selected: 'C',
	readings: [
		{
			request: { kind: 'channel-power', centreHz: 450e6, widthHz: 2e5 },
			trace: 1,
			values: { centreHz: 450e6, widthHz: 2e5 }
		}
	],
	levelUnit: 'dBµV/m',
	antenna: [{ frequencyHz: 450e6, dbPerM: 18.4 }]
};
const power = { type: 'number' as const, text: '-23,', unit: 'dBm' };

describe('getAttemptView(actor, attemptId)', () => {
	it('shows the start settings before anything was swept', async () => {
		const { attempt } = await createAttempt();
		expect(attempt.bench).toMatchObject({
			settings: attempt.exercise.start,
			setUp: null,
			nextRow: 0,
			drawnTo: null,
			resumeFrom: 0,
			clockS: 0
		});
		expect(attempt.exercise).toMatchObject({ number: 1, tries: 3, unit: { number: 6 } });
		expect(attempt.exercise.situationHtml).toMatch(/^<p>The lead loses \*\*\d\.\d dB\*\*/);
		expect(attempt.exercise.questions).toMatchObject([
			{
				id: 'power',
				unit: 'dBm',
				units: ['dBm', 'dBµV', 'dBmV', 'W', 'mW', 'µW', 'nW', 'pW', 'V', 'mV', 'µV']
			},
			{ id: 'width', unit: 'Hz', toleranceText: 'Right within ±10 %' }
		]);
		expect(attempt.exercise.questions[0].toleranceText).toBe('Right within ±1.2 dB');
	});

	it('stands on another device exactly where it stood', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings, { sweeps: 3 });
		const held = { ...settings, traces: [{ mode: 'max-hold' as const }] };
		const { end } = await sweep(actor, attempt.id, held, { from: 3, sweeps: 4 });
		await acknowledgeRows(actor, attempt.id, { row: 5 });
		const asked = { rows: { from: 0, to: 5 }, trace: 1, request: { kind: 'peak' as const } };
		const { reading } = await takeReading(actor, attempt.id, asked, now);
		await saveDrafts(actor, attempt.id, { answers: { power: { ...power, readingId: reading.id } } }, now);
		await revealHint(actor, attempt.id);
		await saveMarkings(actor, attempt.id, { markings }, now);
		const view = await getAttemptView(actor, attempt.id);
		expect(attemptView.parse(view)).toEqual(view);
		expect(view.bench).toMatchObject({
			settings: held,
			setUp: 1,
			nextRow: 7,
			drawnTo: 5,
			resumeFrom: 6,
			restartRow: 0,
			clockS: end?.benchTimeUsedS,
			benchTimeUsedS: end?.benchTimeUsedS
		});
		expect(view.readings).toEqual([reading]);
		expect(view.drafts).toEqual({
			answers: { power: { ...power, readingId: reading.id } },
			savedAt: now.toISOString()
		});
		expect(view.markings).toEqual(markings);
		expect(view.hints).toEqual({ count: 2, revealed: ['Which reading adds the slices up?'] });
		expect((await sweep(actor, attempt.id, held, { from: 6, sweeps: 2 })).state.fromRow).toBe(6);
	});

	it('holds nothing of seed, scene or truths', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings);
		await revealHint(actor, attempt.id);
		const text = JSON.stringify(await getAttemptView(actor, attempt.id));
		const { marks } = await secretsOf(attempt.id);
		expect(marks.length).toBeGreaterThan(4);
		expect(marks.filter((mark) => text.includes(mark))).toEqual([]);
	});

	it('opens an attempt of an earlier engine, though it can be swept no more', async () => {
		const { actor, attempt } = await createAttempt();
		await sweep(actor, attempt.id, settings);
		await Attempt.update({ engineVersion: 0 }, { where: { id: attempt.id } });
		expect((await getAttemptView(actor, attempt.id)).bench.flags).toEqual([]);
		await expect(sweep(actor, attempt.id, settings)).rejects.toMatchObject({ code: 'conflict' });
	});

	it('is not there for anybody else, alike whether it exists or not', async () => {
		const { attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		const refusals = await Promise.allSettled([
			getAttemptView(stranger, attempt.id),
			getAttemptView(stranger, 999_999_999)
		]);
		expect(refusals.map((refusal) => refusal.status === 'rejected' && String(refusal.reason))).toEqual([
			'DomainError: There is no such attempt.',
			'DomainError: There is no such attempt.'
		]);
	});
});

describe('saveDrafts(actor, attemptId, {answers}, now)', () => {
	it('keeps whatever is typed, in place of what was kept before', async () => {
		const { actor, attempt } = await createAttempt();
		await saveDrafts(
			actor,
			attempt.id,
			{ answers: { power, width: { type: 'number', text: '12 px', unit: 'Hz' } } },
			now
		);
		const later = new Date('2026-03-02T10:00:05.250Z');
		await saveDrafts(
			actor,
			attempt.id,
			{ answers: { power: { type: 'number', text: '', unit: 'dBm' } } },
			later
		);
		expect(await Draft.findByPk(attempt.id)).toMatchObject({
			answers: { power: { type: 'number', text: '', unit: 'dBm' } },
			savedAt: later
		});
	});

	it('refuses answers to questions not asked, and readings not taken here', async () => {
		const { actor, attempt } = await createAttempt();
		const refused = (answers: Parameters<typeof saveDrafts>[2]['answers'], field: string) =>
			expect(saveDrafts(actor, attempt.id, { answers }, now)).rejects.toMatchObject({ issues: [{ field }] });
		await refused({ colour: power }, 'answers.colour');
		await refused({ power: { ...power, readingId: 987_654 } }, 'answers.power.readingId');
		expect(await Draft.findByPk(attempt.id)).toBeNull();
	});

	it('is refused once the attempt is closed, and to anybody else', async () => {
		const { actor, attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		await expect(saveDrafts(stranger, attempt.id, { answers: { power } }, now)).rejects.toMatchObject({
			code: 'not_found'
		});
		await Attempt.update({ closedAt: now }, { where: { id: attempt.id } });
		await expect(saveDrafts(actor, attempt.id, { answers: { power } }, now)).rejects.toMatchObject({
			code: 'conflict'
		});
	});

	it('leaves the tables unchanged when it fails late', async () => {
		const { actor, attempt } = await createAttempt();
		Draft.addHook('afterUpsert', 'fail late', () => {
			throw new Error('late');
		});
		await expect(saveDrafts(actor, attempt.id, { answers: { power } }, now)).rejects.toThrow('late');
		Draft.removeHook('afterUpsert', 'fail late');
		expect(await Draft.findByPk(attempt.id)).toBeNull();
	});
});

describe('revealHint(actor, attemptId)', () => {
	it('shows one hint after the other, each once however many ask, and then no more', async () => {
		const { actor, attempt } = await createAttempt();
		const shown = await Promise.all([revealHint(actor, attempt.id), revealHint(actor, attempt.id)]);
		expect(shown.map(({ revealed }) => revealed).sort()).toEqual([1, 2]);
		expect(shown.find(({ revealed }) => revealed === 2)).toEqual({
			hint: 'What has the lead done?',
			revealed: 2,
			left: 0
		});
		await expect(revealHint(actor, attempt.id)).rejects.toMatchObject({ code: 'conflict' });
		expect(await Attempt.findByPk(attempt.id)).toMatchObject({ hintsRevealed: 2 });
	});

	it('is not there for anybody else', async () => {
		const { attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		await expect(revealHint(stranger, attempt.id)).rejects.toMatchObject({ code: 'not_found' });
	});
});

describe('saveMarkings(actor, attemptId, markings, now)', () => {
	it('is refused once the attempt is closed, and to anybody else', async () => {
		const { actor, attempt } = await createAttempt();
		const { actor: stranger } = await createUser('apprentice');
		await expect(saveMarkings(stranger, attempt.id, { markings }, now)).rejects.toMatchObject({
			code: 'not_found'
		});
		await Attempt.update({ closedAt: now }, { where: { id: attempt.id } });
		await expect(saveMarkings(actor, attempt.id, { markings }, now)).rejects.toMatchObject({
			code: 'conflict'
		});
		expect((await getAttemptView(actor, attempt.id)).markings).toBeNull();
	});
});
