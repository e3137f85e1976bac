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

describe('numberLineLayout() with many mistakes close together', () => {
	const crowd = [
		mark(-20, 'yours', 'yours'),
		mark(-19.6, 'true', 'true'),
		...Array.from({ length: 7 }, (_, i) => mark(-20 + i * 0.1, `a mistake of some length ${i}`))
	];

	it.each([330, 412, 900])('lets no words overlap within %d px', (width) => {
		const { marks: placed, above, below } = numberLineLayout(crowd, width);
		for (const row of new Set(placed.map((one) => one.row))) {
			const inRow = placed.filter((one) => one.row === row).sort((a, b) => a.labelX - b.labelX);
			inRow.slice(1).forEach((one, i) => {
				const room = ((one.label.length + inRow[i].label.length) * 6.4) / 2;
				expect(one.labelX - inRow[i].labelX).toBeGreaterThan(room);
			});
			expect(row).toBeGreaterThanOrEqual(-above);
			expect(row).toBeLessThanOrEqual(below);
		}
	});

	it('takes no more rows than it needs', () => {
		const { above, below } = numberLineLayout(marks, 900);
		expect([above, below]).toEqual([1, 1]);
	});
});
