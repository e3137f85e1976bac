import { beforeAll, describe, expect, it } from 'vitest';
import { finding as findingSchema } from '$lib/schemas/finding';
import type { AttemptRecord, GivenAnswer } from '$lib/server/bench/exercise/attempt-record';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import { questionOf, type DrawnAs, type DrawnExercise } from '$lib/server/bench/exercise/drawn-exercise';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { runMethod } from '$lib/server/bench/exercise/run-method';
import { displayedHz } from '$lib/server/bench/grading/displayed';
import { gradeAnswer } from '$lib/server/bench/grading/grade-answer';
import { judge, readAnswer, wrongWays } from '$lib/server/bench/grading/questions/registry';
import { standardOf } from '$lib/server/bench/grading/questions/uncertainty/standard';
import { MORE_QUESTIONS, moreExercise } from '../../../factories/more-questions';

const exercise = moreExercise();
let drawn: DrawnExercise;
let taught: AttemptRecord;
beforeAll(() => {
	drawn = drawExercise(exercise, 5);
	taught = runMethod(drawn).record;
});
const giving = (id: string, answer: GivenAnswer) =>
	judge(drawn, questionOf(drawn, id), { ...taught, answers: { [id]: answer } }).finding;
const written = (id: string) => exercise.questions.find((question) => question.id === id)!;

describe('marks, orders, tables and uncertainties', () => {
	it('are answered rightly by the taught method, from what it reads, and cross the wire', () => {
		const finding = gradeAnswer({ drawn, ...taught });
		expect(finding.questions.map(({ id, verdict }) => [id, verdict])).toEqual(
			exercise.questions.map(({ id }) => [id, 'right'])
		);
		expect(findingSchema.parse(JSON.parse(JSON.stringify(finding)))).toEqual(finding);
	});

	it('are answered wrongly in every way that their proofs make, each named by its own mistake', () => {
		for (const question of drawn.questions) {
			const ways = wrongWays(drawn, question);
			expect(ways.length, question.id).toBeGreaterThan(0);
			for (const { id, make, isNamed } of ways) {
				const { finding } = judge(drawn, question, runMethod(drawn, make(drawn.method)).record);
				expect([question.id, id, finding.verdict, isNamed(finding)]).toEqual([
					question.id,
					id,
					'wrong',
					true
				]);
			}
		}
	});

	it('are unanswered where nothing is given', () => {
		for (const question of drawn.questions) {
			const { finding } = judge(drawn, question, { ...taught, answers: {} });
			expect([finding.verdict, finding.answer]).toEqual(['unanswered', null]);
		}
	});
});

describe('a mark on the plot', () => {
	it('is right within its tolerance of the truth, as the receiver displays it', () => {
		const { truth, toleranceHz } = questionOf(drawn, 'carrier') as DrawnAs<'mark'>;
		const at = (offHz: number) =>
			giving('carrier', { atHz: displayedHz({ drawn }, truth.atHz + offHz) }).verdict;
		expect([at(0.99 * toleranceHz), at(-0.99 * toleranceHz)]).toEqual(['right', 'right']);
		expect([at(1.01 * toleranceHz), at(-1.01 * toleranceHz)]).toEqual(['wrong', 'wrong']);
	});

	it('has both edges of a band, whichever way about, and asks for the one that is missing', () => {
		const band = (atHz: number | null, toHz: number | null) =>
			readAnswer(written('band'), { type: 'mark', atHz, toHz });
		expect(band(2, 1)).toEqual({ given: { atHz: 1, toHz: 2 } });
		expect(band(1, null)).toMatchObject({ issues: [{ field: 'toHz' }] });
		expect(band(null, 1)).toMatchObject({ issues: [{ field: 'atHz' }] });
		expect(band(null, null)).toBeNull();
	});
});

describe('an order', () => {
	it('is drawn from true values, and offered in another order than it was written in, on some seeds', () => {
		const orders = [1, 2, 3, 4, 5, 6].map((seed) => {
			const { items, truth } = questionOf(drawExercise(exercise, seed), 'levels') as DrawnAs<'order'>;
			const by = truth.map((key) => items.find((item) => item.key === key)!.by);
			expect(by).toEqual([...by].sort((a, b) => b - a));
			return items.map(({ id }) => id).join(' ');
		});
		expect(new Set(orders).size).toBeGreaterThan(1);
	});

	it('takes every item once', () => {
		const order = (keys: string[]) => readAnswer(written('levels'), { type: 'order', order: keys });
		expect(order(['b', 'a', 'c'])).toEqual({ given: { order: ['b', 'a', 'c'] } });
		expect(order([])).toBeNull();
		for (const keys of [
			['a', 'b'],
			['a', 'b', 'b'],
			['a', 'b', 'z']
		])
			expect(order(keys)).toMatchObject({ issues: [{ field: 'order' }] });
	});
});

describe('a table of emissions', () => {
	it('names a row that is missing, one that is invented, a level that is off and a wrong verdict', () => {
		const { emissions } = questionOf(drawn, 'table') as DrawnAs<'emissions'>;
		const rows = emissions.map(({ atHz, levelDbm, breaks }) => ({ atHz, levelDbm, breaks }));
		const kinds = (changed: typeof rows) =>
			giving('table', { rows: changed }).mistakes.map(({ kind }) => kind);
		expect(kinds(rows)).toEqual([]);
		expect(kinds(rows.slice(1))).toEqual([`missing-${emissions[0].id}`]);
		expect(kinds([...rows, { atHz: 449.55e6, levelDbm: -60, breaks: false }])).toEqual(['invented-1']);
		expect(kinds(rows.map((row, i) => (i === 0 ? { ...row, levelDbm: row.levelDbm - 4 } : row)))).toEqual([
			`level-${emissions[0].id}`
		]);
		expect(kinds(rows.map((row, i) => (i === 1 ? { ...row, breaks: !row.breaks } : row)))).toEqual([
			`limit-${emissions[1].id}`
		]);
	});

	it('reads its rows with their units, and names the row and the field that can’t be read', () => {
		const row = (frequency: string, level: string, breaks: boolean | null = false) => ({
			frequency: { text: frequency, unit: 'MHz' },
			level: { text: level, unit: 'dBm' },
			breaks
		});
		const read = (...rows: ReturnType<typeof row>[]) =>
			readAnswer(written('table'), { type: 'emissions', rows });
		expect(read(row('450', '-20'), row('', ''))).toEqual({
			given: { rows: [{ atHz: 450e6, levelDbm: -20, breaks: false }] }
		});
		expect(read(row('', ''))).toBeNull();
		expect(read(row('450', '-20'), row('high', '-3 GHz'), row('451', '-9', null))).toMatchObject({
			issues: [{ field: 'rows.1.frequency' }, { field: 'rows.1.level' }, { field: 'rows.2.breaks' }]
		});
	});
});

describe('a value with its uncertainty', () => {
	it('combines a budget: ±0.24 dB at k = 2, ±0.5 and ±0.3 dB rectangular, mismatch, a spread: 0.87 dB expanded', () => {
		// JCGM 100:2008 4.3.7 and 5.1 (from memory); mismatch of two 1.5 : 1, 8.686·0.04/√2; spread 0.1 dB of ten.
		const standards = [
			standardOf(0.24, 'normal', 2),
			standardOf(0.5, 'rectangular', 2),
			standardOf(0.3, 'rectangular', 2),
			standardOf(8.68589 * 0.04, 'arcsine', 2),
			0.03162
		];
		expect(Math.hypot(...standards)).toBeCloseTo(0.43484, 4);
	});

	it('may be stated with another coverage factor, if the uncertainty follows it', () => {
		const { truth, budget } = questionOf(drawn, 'stated') as DrawnAs<'uncertainty'>;
		const one = Math.hypot(...budget.map(({ standardDb }) => standardDb));
		const stating = (expandedDb: number, k: number) =>
			giving('stated', { stated: truth, expandedDb, k }).mistakes.map(({ kind }) => kind);
		expect(stating(2 * one, 2)).toEqual([]);
		expect(stating(3 * one, 3)).toEqual([]);
		expect(stating(one, 2)).toEqual(['standard-for-expanded']);
		expect(stating(0.2 * one, 2)).toEqual(['understated']);
		expect(stating(9 * one, 2)).toEqual(['overstated']);
	});

	it('is refused field by field', () => {
		const read = (value: string, expanded: string, k: string) =>
			readAnswer(written('stated'), {
				type: 'uncertainty',
				value: { text: value, unit: 'dBm' },
				expanded,
				k
			});
		expect(read('-20', '0.9 dB', '2')).toMatchObject({ given: { stated: -20, expandedDb: 0.9, k: 2 } });
		expect(read('', '', '')).toBeNull();
		expect(read('loud', 'some', '7')).toMatchObject({
			issues: [{ field: 'value' }, { field: 'expanded' }, { field: 'k' }]
		});
	});
});

describe('as their authors write them', () => {
	// What an author may write anywhere.
	// eslint-disable-next-line @typescript-eslint/no-explicit-any
	type Draft = any;
	it.each<[string, (questions: Draft, method: Draft) => void, string]>([
		[
			'a flag without a tolerance in Hz',
			([flag]) => (flag.tolerance = { relative: 0.1 }),
			'questions[0].tolerance'
		],
		[
			'a band’s mistake with one edge',
			([, band]) => delete band.mistakes[0].toHz,
			'questions[1].mistakes[0].toHz'
		],
		['items nearer than they should be', ([, , order]) => (order.apart = 90), 'questions[2].items'],
		['an item that the method forgets', (_, method) => delete method[6].by.above, 'method[6].by.above'],
		[
			'a table’s tolerance under the receiver’s error',
			([, , , table]) => (table.toleranceDb = 0.1),
			'questions[3].toleranceDb'
		],
		[
			'verdicts asked of some rows only',
			([, , , table]) => delete table.emissions[1].breaks,
			'questions[3].emissions'
		],
		['a value without its k', (_, method) => delete method[8].k, 'method[8].k']
	])('refuses %s', (_, change, field) => {
		const draft = structuredClone(MORE_QUESTIONS);
		change(draft.questions, draft.method);
		const fields = (() => {
			try {
				moreExercise(draft);
				return [];
			} catch (error) {
				if (!(error instanceof ExerciseError)) throw error;
				return error.issues.map((issue) => issue.field);
			}
		})();
		expect(fields).toContain(field);
	});
});
