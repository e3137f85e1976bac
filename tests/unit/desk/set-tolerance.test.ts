import { describe, expect, it } from 'vitest';
import { dotsOf, scaleOf, worstSeeds } from '$lib/components/desk/scatter-layout';
import { withTolerance } from '$lib/components/desk/set-tolerance';

const TEXT = `slug: x
questions:
  - id: power # the first
    tolerance: { absolute: 1.0 } # as agreed
  - id: width
    tolerance:
      absolute: 200
method:
  - do: sweep
`;

describe('withTolerance(text, question, tolerance)', () => {
	it('changes that number and nothing else, in braces and below', () => {
		const plain = TEXT.replace(' # the first', '');
		expect(withTolerance(plain, 'power', 0.7)).toBe(plain.replace('1.0', '0.7'));
		expect(withTolerance(plain, 'width', 180)).toBe(plain.replace('200', '180'));
	});

	it('gives up where it can’t be sure', () => {
		expect(withTolerance(TEXT, 'level', 1)).toBeNull();
		expect(withTolerance(TEXT.replace('absolute: 1.0', 'relative: 0.1'), 'power', 1)).toBeNull();
		expect(withTolerance('slug: x\n', 'power', 1)).toBeNull();
	});
});

describe('the strip of a proof', () => {
	it('shows every error that there is, within its width', () => {
		const errors = [-3, null, 0, 0.1, 9];
		const scale = scaleOf([errors], 1);
		const dots = dotsOf(errors, scale, { widthPx: 320, heightPx: 24, cellPx: 2 });
		expect(dots.map(({ index }) => index)).toEqual([0, 2, 3, 4]);
		for (const { x, y } of dots) {
			expect(x).toBeGreaterThanOrEqual(0);
			expect(x).toBeLessThanOrEqual(320);
			expect(y).toBeGreaterThanOrEqual(0);
			expect(y).toBeLessThanOrEqual(24);
		}
	});

	it('offers the seeds where the taught method is furthest off or can’t be done, and where a mistake comes nearest', () => {
		const errors = [0.1, -0.5, null, 0.3];
		expect(worstSeeds({ errors, mistake: null }, 1)).toEqual([3, 2, 4]);
		expect(worstSeeds({ errors, mistake: 'lead' }, 1)).toEqual([1, 4, 2]);
	});
});
