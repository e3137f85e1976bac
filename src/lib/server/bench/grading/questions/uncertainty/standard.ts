import type { laws } from '$lib/schemas/questions/uncertainty';

/** Standard uncertainty of a stated ±, by the law it follows: ±a rectangular gives a/√3, and so on (JCGM 100:2008, 4.3.7; from memory). */
export function standardOf(db: number, law: (typeof laws)[number], k: number): number {
	const divisor = { rectangular: Math.sqrt(3), triangular: Math.sqrt(6), arcsine: Math.SQRT2, normal: k }[
		law
	];
	return Math.abs(db) / divisor;
}

/** Standard uncertainties combined: the root of the sum of their squares (JCGM 100:2008, 5.1). */
export const combined = (standards: readonly number[]): number => Math.hypot(...standards);
