import { describe, expect, it } from 'vitest';
import { numberLineLayout } from '$lib/components/finding/number-line-layout';

const mark = (
	value: number,
	label: string,
	role: 'yours' | 'true' | 'mistake' = 'mistake',
	matched = false
) => ({ value, label, role, matched });
const marks = [
	mark(-23.6, 'yours', 'yours'),
	mark(-9.7, 'true', 'true'),
	mark(-20.4, 'one point, lead added'),
	mark(-12.9, 'lead left out'),
	mark(-16.1, 'lead taken off twice'),
	mark(-23.6, 'one point, lead left out', 'mistake', true)
];

describe('numberLineLayout(marks, width)', () => {
	const layout = numberLineLayout(marks, 412);

	it('stands every mark in its order of value', () => {
		const sorted = [...layout.marks].sort((a, b) => a.value - b.value).map(({ x }) => x);
		expect(sorted).toEqual([...sorted].sort((a, b) => a - b));
	});

	it('puts yours and true next above the axis, and the mistake made below it', () => {
		expect(layout.marks.map(({ row }) => row).filter((row) => row === -1)).toHaveLength(2);
		expect(layout.marks[5].row).toBe(1);
	});

	it('keeps words of one row clear of each other', () => {
		for (const row of [-2, -1, 1, 2]) {
			const inRow = layout.marks.filter((m) => m.row === row).sort((a, b) => a.labelX - b.labelX);
			for (const [i, m] of inRow.slice(1).entries()) {
				expect(m.labelX - inRow[i].labelX).toBeGreaterThan(
					((m.label.length + inRow[i].label.length) * 6.4) / 2
				);
			}
		}
	});

	it('writes figures at round values only', () =>
		expect(layout.ticks.flatMap(({ figure }) => figure ?? [])).toEqual(['−20', '−15', '−10']));
});
