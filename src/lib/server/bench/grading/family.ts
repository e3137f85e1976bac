import type { QuantityKind } from '$lib/schemas/quantity';
import type { BenchRequest } from '$lib/schemas/reading';

/** Readings by what they are of: one point, a band's power, a density; every other kind is a family of its own. */
export type Family = 'point' | 'band' | 'density' | BenchRequest['kind'];
/** What is asked or read. */
type Kind = BenchRequest['kind'] | QuantityKind;
const FAMILIES: Partial<Record<Kind, Family>> = {
	marker: 'point',
	peak: 'point',
	'next-peak': 'point',
	minimum: 'point',
	'pulse-level': 'point',
	'band-power': 'band',
	'channel-power': 'band',
	'noise-density': 'density',
	'power-density': 'density'
};
export const familyOf = (kind: Kind): Family => FAMILIES[kind] ?? (kind as BenchRequest['kind']);
