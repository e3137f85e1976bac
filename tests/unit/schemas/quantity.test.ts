import { describe, expect, it } from 'vitest';
import { quantity as quantitySchema } from '$lib/schemas/quantity';

describe('quantity (schema)', () => {
	it('refuses unknown keys by name, and kinds that don’t exist', () => {
		const issues = (value: unknown) =>
			quantitySchema
				.safeParse(value)
				.error?.issues.map((issue) => issue.message)
				.join();
		expect(issues({ kind: 'marker', atHz: 1e9, at: 3 })).toContain('"at"');
		expect(issues({ kind: 'minimum' })).toBeDefined();
		expect(issues({ kind: 'band-power', startHz: 2, stopHz: 1 })).toContain('stopHz must be greater');
		expect(issues({ kind: 'occupied-bandwidth', percent: 99, centreHz: 1e9 })).toContain(
			'centreHz and widthHz'
		);
		expect(issues({ kind: 'peak', emitters: [] })).toBeDefined();
	});
});
