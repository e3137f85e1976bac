import { describe, expect, it } from 'vitest';
import type { TypedAnswer } from '$lib/schemas/answer';
import { attemptView } from '$lib/schemas/attempt';
import { Answer } from '$lib/server/db/models/answer';
import { getReport } from '$lib/server/services/attempts/get-report';
import { handIn } from '$lib/server/services/attempts/hand-in';
import { saveDrafts } from '$lib/server/services/attempts/save-drafts';
import { getAttemptView } from '$lib/server/services/attempts/get-attempt-view';
import { createAttempt, secretsOf, sweep } from '../../factories/attempt';
import { MORE_QUESTIONS } from '../../factories/more-questions';
import { TYPED_QUESTIONS } from '../../factories/typed-questions';

const now = new Date('2026-03-02T10:00:00Z');

describe('answers that are no numbers', () => {
	it('show nothing of what is right, are kept as typed, handed in, judged and reported', async () => {
		const { actor, attempt } = await createAttempt(TYPED_QUESTIONS);
		expect(JSON.stringify(attempt.exercise.questions)).not.toMatch(
			/"right":|conditions|"chosen"|"id":"(carrier|nothing)/
		);
		const { drawn } = await secretsOf(attempt.id);
		const rightOf = (id: string) => {
			const question = drawn.questions.find((one) => one.id === id);
			return question?.type === 'choice'
				? question.options.filter(({ right }) => right).map(({ key }) => key)
				: [];
		};
		const { settings } = attempt.bench;
		await sweep(actor, attempt.id, { ...settings, detector: 'average', scale: 'power' }, { sweeps: 2 });
		const answers: Record<string, TypedAnswer> = {
			beside: { type: 'choice', chosen: rightOf('beside') },
			'true-of-it': { type: 'choice', chosen: ['c'] },
			settled: { type: 'set-up', setUp: 0 }
		};
		await saveDrafts(actor, attempt.id, { answers }, now);
		const seen = await getAttemptView(actor, attempt.id);
		expect(attemptView.parse(JSON.parse(JSON.stringify(seen))).drafts.answers).toEqual(answers);

		const { finding } = await handIn(actor, attempt.id, { answers }, now);
		const verdicts = Object.fromEntries(finding.questions.map(({ id, verdict }) => [id, verdict]));
		expect(verdicts['true-of-it']).toBe('wrong');
		expect(verdicts.beside).toMatch(/^right/);
		const kept = await Answer.findAll({ where: { attemptId: attempt.id }, order: ['question'] });
		expect(kept.map(({ question, typed, value }) => [question, typed, value])).toEqual(
			['beside', 'settled', 'true-of-it'].map((id) => [id, answers[id], null])
		);
		const report = await getReport(actor, attempt.id);
		expect(report.answers.map(({ answer, yours }) => [typeof answer, yours])).toContainEqual([
			'string',
			null
		]);
	});

	it.each<[string, unknown, Record<string, TypedAnswer>, string]>([
		[
			'an option not offered',
			TYPED_QUESTIONS,
			{ beside: { type: 'choice', chosen: ['q'] } },
			'answers.beside.chosen'
		],
		[
			'two where one is asked',
			TYPED_QUESTIONS,
			{ beside: { type: 'choice', chosen: ['a', 'b'] } },
			'answers.beside.chosen'
		],
		['another type', TYPED_QUESTIONS, { beside: { type: 'order', order: ['a'] } }, 'answers.beside.type'],
		[
			'a set-up not swept here',
			TYPED_QUESTIONS,
			{ settled: { type: 'set-up', setUp: 99 } },
			'answers.settled.setUp'
		],
		['half a band', MORE_QUESTIONS, { band: { type: 'mark', atHz: 1e6, toHz: null } }, 'answers.band.toHz'],
		['half an order', MORE_QUESTIONS, { levels: { type: 'order', order: ['a'] } }, 'answers.levels.order'],
		[
			'a row that can’t be read',
			MORE_QUESTIONS,
			{
				table: {
					type: 'emissions',
					rows: [
						{ frequency: { text: 'high', unit: 'MHz' }, level: { text: '-9', unit: 'dBm' }, breaks: true }
					]
				}
			},
			'answers.table.rows.0.frequency'
		],
		[
			'an uncertainty without its factor',
			MORE_QUESTIONS,
			{ stated: { type: 'uncertainty', value: { text: '-9', unit: 'dBm' }, expanded: '1', k: '' } },
			'answers.stated.k'
		]
	])('are refused by field: %s', async (_, over, answers, field) => {
		const { actor, attempt } = await createAttempt(over as never);
		await expect(handIn(actor, attempt.id, { answers }, now)).rejects.toMatchObject({
			code: 'invalid',
			issues: [{ field }]
		});
		expect(await Answer.count({ where: { attemptId: attempt.id } })).toBe(0);
	});
});
