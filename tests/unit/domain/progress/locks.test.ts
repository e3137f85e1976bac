import { describe, expect, it } from 'vitest';
import { lockOf, type UnitStanding } from '$lib/server/domain/progress/locks';

const unit = (number: number, right: number, over: Partial<UnitStanding> = {}): UnitStanding => ({
	slug: `unit-${number}`,
	title: `Unit ${number}’s name`,
	needs: [],
	doneWith: 2,
	...{ number, right },
	...over
});
const needing = (...needs: string[]) => ({ needs });

describe('lockOf(unit, all)', () => {
	it('holds nothing shut that needs nothing, or whose needs are done', () => {
		expect(lockOf(needing(), [unit(1, 0)])).toBeNull();
		expect(lockOf(needing('unit-1'), [unit(1, 2), unit(2, 0)])).toBeNull();
	});

	it('says what opens a unit, and how much of it is missing', () => {
		const lock = lockOf(needing('unit-1'), [unit(1, 1)]);
		expect(lock).toEqual({
			text: 'First comes unit 1, Unit 1’s name: 1 more exercise right there opens this unit.',
			needs: [{ number: 1, slug: 'unit-1', title: 'Unit 1’s name' }]
		});
		expect(lockOf(needing('unit-1'), [unit(1, 0)])?.text).toContain('2 exercises right there open this unit');
	});

	it('names every unit that is missing, and none that is done', () => {
		const lock = lockOf(needing('unit-1', 'unit-2', 'unit-3'), [unit(1, 0), unit(2, 2), unit(3, 1)]);
		expect(lock?.needs.map(({ number }) => number)).toEqual([1, 3]);
		expect(lock?.text).toContain('2 exercises right of unit 1 and 1 more exercise right of unit 3 open');
	});
});
