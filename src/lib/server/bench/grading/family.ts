import type { BenchRequest } from '$lib/schemas/reading';

/** Readings by what they are of: one point, a band's power, a density; every other kind is a family of its own. */
export type Family = 'point' | 'band' | 'density' | BenchRequest['kind'];
const FAMILIES: Partial<Record<BenchRequest['kind'], Family>> = {
	marker: 'point',
	peak: 'point',
	'next-peak': 'point',
	minimum: 'point',
	'band-power': 'band',
	'channel-power': 'band',
	'noise-density': 'density',
	'power-density': 'density'
};
export const familyOf = (kind: BenchRequest['kind']): Family => FAMILIES[kind] ?? kind;
