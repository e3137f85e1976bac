import { describe, expect, it } from 'vitest';
import { startValues } from '$lib/server/bench/figure/choices';
import { computeFigure } from '$lib/server/bench/figure/compute-figure';
import { readContent } from '$lib/server/content/read-content';

const figures = readContent('content').flatMap(({ units }) =>
	units.flatMap(({ number, figures }) => figures.map((figure) => ({ unit: number, id: figure.id, figure })))
);

describe('the figures of the course', () => {
	it.each(figures)(
		'unit $unit, $id: every choice can be made, and every control changes it',
		({ figure }) => {
			const start = startValues(figure);
			const first = computeFigure(figure, start);
			const isProtected = first.flags.some(({ kind }) => kind === 'input-protection');
			// A lesson that opens on a problem would teach the wrong thing first.
			expect(first.readings.filter((outcome) => 'problem' in outcome)).toEqual([]);
			expect(first.readings).toHaveLength(isProtected ? 0 : figure.readings.length);
			for (const [i, { choices }] of figure.controls.entries()) {
				for (const choice of choices.filter((other) => other !== start[i])) {
					const state = computeFigure(
						figure,
						start.map((value, j) => (j === i ? choice : value))
					);
					expect(state.values[i]).toBe(choice);
					expect({ ...state, values: [] }).not.toEqual({ ...first, values: [] });
				}
			}
		}
	);
});
