import { describe, expect, it } from 'vitest';
import { numberAnswers, type AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import type { FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { drawnFrom } from '../../factories/made-on-bench';

const drawn = drawnFrom('pilot-beside-its-carrier', 1);
/** The taught set-up; then two markers, each read on its own, instead of one read from the other. */
const twoMarkers = drawn.method.flatMap((step) => {
	if (step.do !== 'read' || step.reading.kind !== 'delta') return [step];
	const { fromHz, toHz } = step.reading as { fromHz: number; toHz: number };
	return [fromHz, toHz].map((atHz, i) => ({
		...step,
		reading: { kind: 'marker' as const, atHz },
		as: i === 0 ? `${step.as}From` : step.as
	}));
}) satisfies FilledStep[];
const { record } = runMethod(drawn, twoMarkers);
const taught = runMethod(drawn).record;
const graded = (answers: AttemptRecord['answers']) => gradeAnswer({ drawn, ...record, answers }).questions;

describe('a difference worked out between two markers', () => {
	const attached = record.readings.at(-1)?.id;
	const answers = Object.fromEntries(
		Object.entries(numberAnswers(taught)).map(([id, { value }]) => [id, { value, readingId: attached }])
	);

	it('is told that the sum is sound, and that one marker read from the other is one reading', () => {
		for (const question of graded(answers)) {
			expect(question.verdict).toBe('right-but-method');
			expect(question.title).toBe('The number is right, worked out between two markers.');
			expect(question.remarks.map(({ code }) => code)).toEqual(['between-markers']);
		}
	});

	it('is told the same when no reading is attached', () => {
		const bare = Object.fromEntries(
			Object.entries(numberAnswers(taught)).map(([id, { value }]) => [id, { value }])
		);
		for (const { remarks } of graded(bare))
			expect(remarks.map(({ code }) => code)).toEqual(['between-markers']);
	});

	it('needs both markers: with one of them gone nothing gives the number', () => {
		const alone = { ...record, readings: record.readings.slice(-1), answers };
		for (const { remarks } of gradeAnswer({ drawn, ...alone }).questions)
			expect(remarks.map(({ code }) => code)).toContain('not-from-evidence');
	});
});
