import { describe, expect, it } from 'vitest';
import { finding as findingSchema } from '$lib/schemas/finding';
import type { FindingAs } from '$lib/schemas/questions/finding';
import type { AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { questionOf, type DrawnAs } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { judge, readAnswer } from '$lib/server/bench/grading/questions/registry';
import { TYPED_QUESTIONS, typedExercise } from '../../../factories/typed-questions';

const exercise = typedExercise();
const drawn = drawExercise(exercise, 4);
const taught = runMethod(drawn).record;
const beside = questionOf(drawn, 'beside') as DrawnAs<'choice'>;
const several = questionOf(drawn, 'true-of-it') as DrawnAs<'choice'>;
const keyOf = (question: DrawnAs<'choice'>, id: string) => question.options.find((one) => one.id === id)!.key;

const choosing = (question: DrawnAs<'choice'>, ids: string[], record: AttemptRecord = taught) =>
	judge(drawn, question, {
		...record,
		answers: { [question.id]: { chosen: ids.map((id) => keyOf(question, id)) } }
	}).finding as FindingAs<'choice'>;
const rightOf = (question: DrawnAs<'choice'>) =>
	question.options.filter(({ right }) => right).map(({ id }) => id);
const wrongOf = (question: DrawnAs<'choice'>) =>
	question.options.filter(({ right }) => !right).map(({ id }) => id);

describe('a question that asks to choose', () => {
	it('is answered rightly by the taught method, from what it reads, and the finding crosses the wire', () => {
		const finding = gradeAnswer({ drawn, ...taught });
		expect(finding.questions.map(({ verdict }) => verdict)).toEqual(['right', 'right', 'right']);
		expect(findingSchema.parse(JSON.parse(JSON.stringify(finding)))).toEqual(finding);
		expect(finding.doneRight.find(({ text }) => text.startsWith('Answer: What stands'))?.answer).toMatch(
			/^“.+”$/
		);
		expect(finding.log.at(-2)?.text).toMatch(/^Answer 2: “Its power is spread over a band”/);
	});

	it('has its right options from the draw: parameters for one, a true level for the other', () => {
		for (const seed of [1, 2, 3, 4, 5, 6]) {
			const other = drawExercise(exercise, seed);
			const { neighbour, carrierDbm } = other.parameters;
			expect(rightOf(questionOf(other, 'beside') as DrawnAs<'choice'>)).toEqual([
				neighbour === 'none' ? 'nothing' : 'carrier'
			]);
			expect(rightOf(questionOf(other, 'true-of-it') as DrawnAs<'choice'>)).toEqual(
				(carrierDbm as number) > -25 ? ['spread', 'strong'] : ['spread']
			);
		}
	});

	it('offers its options in an order of each seed’s own, by letters that tell nothing of how they were written', () => {
		const orders = Array.from({ length: 12 }, (_, seed) => {
			const { options } = questionOf(drawExercise(exercise, seed), 'beside') as DrawnAs<'choice'>;
			expect(options.map(({ key }) => key)).toEqual(['a', 'b', 'c']);
			return options.map(({ id }) => id).join(' ');
		});
		expect(new Set(orders).size).toBeGreaterThan(2);
		expect(several.options.map(({ id }) => id)).toEqual(['spread', 'strong', 'pulsed']);
	});

	it.each(wrongOf(beside))('finds %s wrong and says what choosing it says', (id) => {
		const { verdict, mistakes, options } = choosing(beside, [id]);
		expect(verdict).toBe('wrong');
		expect(mistakes.map(({ kind }) => kind)).toEqual([`chose-${id}`]);
		if (id === 'carrier') expect(mistakes[0].title).toBe('There is none');
		expect(options.filter(({ chosen }) => chosen)).toHaveLength(1);
	});

	it('names of several each that doesn’t belong and each that is left out', () => {
		const right = rightOf(several);
		expect(choosing(several, [...right, 'pulsed']).mistakes.map(({ kind }) => kind)).toEqual([
			'chose-pulsed'
		]);
		const { verdict, mistakes, title } = choosing(several, ['pulsed']);
		expect(verdict).toBe('wrong');
		expect(mistakes.map(({ kind }) => kind)).toEqual([
			...right.map((id) => `left-out-${id}`),
			'chose-pulsed'
		]);
		expect(title).toMatch(/^You chose one that doesn’t belong, and left .+ out/);
	});

	it('is right by luck where nothing was swept that could tell', () => {
		const away = {
			...taught,
			log: [{ settings: { centreHz: 449e6, spanHz: 1e6 }, firstRow: 0, sweeps: 2, clockS: 0 }]
		};
		const { verdict, remarks } = choosing(beside, rightOf(beside), away);
		expect(verdict).toBe('right-but-method');
		expect(remarks.map(({ text }) => text)).toEqual(['You never looked there.']);
	});

	it('is unanswered where nothing is chosen', () => {
		const { finding } = judge(drawn, beside, { ...taught, answers: {} });
		expect(finding).toMatchObject({ verdict: 'unanswered', answer: null, mistakes: [] });
	});

	it('reads letters that are offered, once each, and one where one is asked', () => {
		const [one, more] = exercise.questions;
		const chosen = (letters: string[]) => ({ type: 'choice' as const, chosen: letters });
		expect(readAnswer(more, chosen(['b', 'a', 'b']))).toEqual({ given: { chosen: ['a', 'b'] } });
		expect(readAnswer(one, chosen([]))).toBeNull();
		expect(readAnswer(one, chosen(['a', 'b']))).toEqual({
			issues: [{ field: 'chosen', message: 'Choose one.' }]
		});
		expect(readAnswer(one, chosen(['z']))).toMatchObject({ issues: [{ field: 'chosen' }] });
		expect(readAnswer(one, { type: 'set-up', setUp: 1 })).toMatchObject({ issues: [{ field: 'type' }] });
	});
});

describe('a choice as its author writes it', () => {
	const refused = (change: (questions: never[], method: never[]) => void, field: string) => {
		const draft = structuredClone(TYPED_QUESTIONS);
		change(draft.questions as never[], draft.method as never[]);
		let issues: { field: string }[] = [];
		try {
			typedExercise(draft);
		} catch (error) {
			if (!(error instanceof ExerciseError)) throw error;
			issues = [...error.issues];
		}
		expect(issues.map((issue) => issue.field)).toContain(field);
	};
	// What an author may write anywhere.
	// eslint-disable-next-line @typescript-eslint/no-explicit-any
	type Draft = any;

	it('must have exactly one right option on every draw, where one is to be chosen', () =>
		refused(([one]: Draft) => (one.options[2].right = true), 'questions[0].options'));
	it('names each option once', () =>
		refused(([one]: Draft) => (one.options[2].id = 'carrier'), 'questions[0].options[2].id'));
	it('tells in its options nothing that the learner isn’t told', () =>
		refused(([one]: Draft) => (one.options[2].text = 'At {carrierDbm} dBm'), 'questions[0].options[2].text'));
	it('is answered by a method that knows its options', () =>
		refused((_, method: Draft) => (method[5].chosen.music = true), 'method[5].chosen.music'));
	it('is answered by a choice and by nothing else', () => {
		refused((_, method: Draft) => (method[5].value = '=besideDbm'), 'method[5].value');
		refused((_, method: Draft) => delete method[5].chosen, 'method[5].chosen');
	});
	it('is refused with a type that there is none of', () =>
		refused(([one]: Draft) => (one.type = 'riddle'), 'questions[0].type'));
});
