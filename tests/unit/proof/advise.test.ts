import { describe, expect, it } from 'vitest';
import type { ProofRow } from '$lib/schemas/proof-view';
import { adviseOn, greatestTolerance, leastTolerance } from '$lib/server/bench/proof/advise';

const question = {
	id: 'power',
	text: 'Power',
	type: 'number' as const,
	unit: 'dBm',
	digits: 1,
	tolerance: 0.7,
	absolute: true
};
/** Errors spread evenly over two limits, 200 of them. */
const spread = (from: number, to: number) =>
	Array.from({ length: 200 }, (_, i) => from + ((to - from) * i) / 199);
const rowOf = (mistake: string | null, errors: (number | null)[], failures: string[] = []): ProofRow => ({
	question: 'power',
	mistake,
	label: mistake ?? 'Taught method',
	passShare: errors.filter((error) => error !== null && Math.abs(error) <= 0.7).length / errors.length,
	limit: mistake === null ? 0.99 : 0.05,
	errors,
	scatter: 0.31,
	failures
});
const taught = rowOf(null, spread(-0.3, 0.3));
const advise = (...rows: ProofRow[]) => adviseOn([question], rows, { apartShare: 1, failures: [] });

describe('adviseOn(questions, rows, table)', () => {
	it('says nothing of what holds', () => {
		expect(advise(taught, rowOf('lead-left-out', spread(-6, -4)))).toEqual([]);
	});

	it('offers the tolerance that the taught method needs', () => {
		const [advice] = advise(rowOf(null, spread(-0.9, 0.9)));
		expect(advice.says).toContain('narrower than what the taught method’s own answers scatter by, 0.31 dB');
		expect(advice.tolerance).toBeCloseTo(0.9, 6);
	});

	it('offers the tolerance that stops a mistake, where the taught method holds it', () => {
		const [advice] = advise(taught, rowOf('half the channel', spread(-1.2, -0.56)));
		expect(advice.says).toMatch(/^“Half the channel” lands inside ±0\.7 dB/);
		expect(advice.tolerance).toBeGreaterThan(0.3);
		expect(advice.tolerance).toBeLessThanOrEqual(0.57);
	});

	it('offers none where nothing between the two is free', () => {
		const [advice] = advise(taught, rowOf('half the channel', spread(-0.6, 0)));
		expect(advice).toMatchObject({ tolerance: null });
		expect(advice.says).toContain('No tolerance stops it');
	});

	it('says on how many seeds the taught method can’t be done', () => {
		const [advice] = advise(rowOf(null, [null, ...spread(-0.3, 0.3).slice(1)]));
		expect(advice.says).toContain('on 1 of 200 seeds');
	});

	it('passes on what a mistake can’t be told from, and what lies too near', () => {
		const mixed = rowOf('lead', spread(-6, -4), ['is named on 80.0 %, at least 95.0 % asked']);
		const rows = adviseOn([question], [taught, mixed], { apartShare: 0.9, failures: [] });
		expect(rows.map(({ says }) => says)).toEqual([
			expect.stringContaining('another reason gives the same number'),
			expect.stringContaining('on 10.0 % of the seeds')
		]);
	});
});

it('leastTolerance and greatestTolerance keep to the shares that a proof asks for', () => {
	const least = leastTolerance(taught);
	expect(taught.errors.filter((error) => Math.abs(error!) <= least).length / 200).toBeGreaterThanOrEqual(
		0.99
	);
	const mistake = rowOf('x', spread(0.5, 2));
	const greatest = greatestTolerance(mistake);
	expect(mistake.errors.filter((error) => Math.abs(error!) <= greatest).length / 200).toBeLessThanOrEqual(
		0.005
	);
});
