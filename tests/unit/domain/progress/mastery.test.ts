import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { levels, masteryOf, worthOf, type Worth } from '$lib/server/domain/progress/mastery';

const worths = fc.array(fc.constantFrom<Worth>(0, 0.5, 1), { maxLength: 20 });
const rank = (answers: Worth[]) => levels.indexOf(masteryOf(answers).level);

describe('masteryOf(worths)', () => {
	it('knows nothing of a skill that was never asked for', () => {
		expect(masteryOf([])).toEqual({ level: 'not begun', share: null, raise: { answers: 1, level: 'begun' } });
	});

	it('weighs the newest answer most: 1, and each before it 0.8 of the one after', () => {
		// (1 + 0.8·0 + 0.64·1) / (1 + 0.8 + 0.64) and (0 + 0.8·1 + 0.64·0) / 2.44, by hand.
		expect(masteryOf([1, 0, 1]).share).toBeCloseTo(0.6721, 4);
		expect(masteryOf([0, 1, 0]).share).toBeCloseTo(0.3279, 4);
	});

	it('needs enough answers for a level: one right is begun, two on the way, four sure', () => {
		expect(masteryOf([1]).level).toBe('begun');
		expect(masteryOf([1, 1]).level).toBe('on the way');
		expect(masteryOf([1, 1, 1]).level).toBe('on the way');
		expect(masteryOf([1, 1, 1, 1]).level).toBe('sure');
	});

	it('counts right by a faulty method half', () => {
		expect(worthOf('right')).toBe(1);
		expect(worthOf('right-but-method')).toBe(0.5);
		expect([worthOf('wrong'), worthOf('unanswered'), worthOf(null)]).toEqual([0, 0, 0]);
		expect(masteryOf([0.5, 0.5, 0.5, 0.5]).level).toBe('on the way');
	});

	it('forgets what is more than eight answers back', () => {
		fc.assert(
			fc.property(
				worths,
				fc.array(fc.constantFrom<Worth>(0, 0.5, 1), { minLength: 8, maxLength: 8 }),
				(old, last) => {
					expect(masteryOf([...old, ...last]).share).toBeCloseTo(masteryOf(last).share ?? NaN, 12);
				}
			)
		);
	});

	it('says how many right in a row raise it, and they do; nothing is above sure', () => {
		fc.assert(
			fc.property(worths, (answers) => {
				const { level, raise } = masteryOf(answers);
				if (!raise) return level === 'sure';
				const then = (count: number) => rank([...answers, ...Array<Worth>(count).fill(1)]);
				return then(raise.answers) > rank(answers) && then(raise.answers - 1) <= rank(answers);
			})
		);
	});

	it('never falls by a right answer that takes no worse one’s place', () => {
		fc.assert(
			fc.property(worths, (answers) => rank([...answers, 1]) >= rank(answers) || answers.length >= 8)
		);
	});
});
