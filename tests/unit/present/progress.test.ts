import { describe, expect, it } from 'vitest';
import { presentProgress } from '$lib/server/present/progress';

const exercise = { slug: 'x', title: 'X', number: 1, tries: 5 };
const at = new Date('2026-03-02T10:00:00Z');
const attempt = (id: number, rightAnswers: number, passed: 0 | 1 | null = 0) => ({
	...{ id, number: id, startedAt: at, closedAt: passed === null ? null : at, passed },
	...{ questions: 3, answered: 3, rightAnswers, cleanAnswers: rightAnswers, practice: 0 as 0 | 1 }
});
const counting = (...attempts: ReturnType<typeof attempt>[]) =>
	presentProgress(exercise, attempts, at)
		.attempts.filter(({ counts }) => counts)
		.map(({ id }) => id);

describe('presentProgress(exercise, attempts)', () => {
	it('lets the best attempt count: the first passed, else the first with most answers right', () => {
		expect(counting(attempt(1, 1), attempt(2, 2), attempt(3, 2))).toEqual([2]);
		expect(counting(attempt(1, 3, 1), attempt(2, 2), attempt(3, 3, 1))).toEqual([1]);
	});

	it('lets none count before one has a right answer', () => {
		expect(counting(attempt(1, 0), attempt(2, 0, null))).toEqual([]);
		expect(counting()).toEqual([]);
	});
});
