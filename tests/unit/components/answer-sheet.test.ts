import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { AnswerSheet } from '$lib/components/bench/state/answer-sheet.svelte';
import { Refusal } from '$lib/components/bench/state/bench-wire';
import { waiting, wireOf } from './bench-wire-of';

const questions = [
	{
		type: 'number' as const,
		id: 'power',
		text: 'Power',
		unit: 'dBm' as const,
		units: ['dBm'],
		digits: 1,
		toleranceText: 'Right within ±1 dB'
	}
];
const drafts = { answers: {}, savedAt: null };
const savedAt = '2026-03-02T10:00:00.000Z';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('AnswerSheet', () => {
	it('hands in only once the draft under way has been kept, so that none arrives at a closed attempt', async () => {
		const sent: string[] = [];
		const keeping = waiting<string>();
		const wire = wireOf({
			saveDrafts: () => (sent.push('draft'), keeping.promise),
			handIn: () => (sent.push('answers'), Promise.resolve())
		});
		const sheet = new AnswerSheet(questions, drafts, wire);
		sheet.type('power', '-23');
		await vi.advanceTimersByTimeAsync(700);
		const handedIn = sheet.handIn();
		await vi.advanceTimersByTimeAsync(100);
		expect(sent).toEqual(['draft']);
		keeping.resolve(savedAt);
		expect(await handedIn).toBe(true);
		expect(sent).toEqual(['draft', 'answers']);
		expect(sheet.closed).toBe(true);
		sheet.flush();
		expect(sent).toHaveLength(2);
	});

	it('knows that the attempt was handed in elsewhere, from a draft or from its own hand-in', async () => {
		const refused = () => Promise.reject(new Refusal(409, 'This attempt has been handed in.'));
		const typing = new AnswerSheet(questions, drafts, wireOf({ saveDrafts: refused }));
		typing.type('power', '-23');
		await vi.advanceTimersByTimeAsync(700);
		expect(typing.closed).toBe(true);
		const late = new AnswerSheet(questions, drafts, wireOf({ handIn: refused }));
		expect(await late.handIn()).toBe(false);
		expect(late.closed).toBe(true);
	});

	it('stays open when answers are refused, with the reason at the question', async () => {
		const issues = [{ field: 'answers.power.text', message: 'That is no level.' }];
		const wire = wireOf({ handIn: () => Promise.reject(new Refusal(422, 'No.', issues)) });
		const sheet = new AnswerSheet(questions, drafts, wire);
		expect(await sheet.handIn()).toBe(false);
		expect(sheet.closed).toBe(false);
		expect(sheet.problems).toEqual({ power: 'That is no level.' });
	});
});
