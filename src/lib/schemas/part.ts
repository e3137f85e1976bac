/**
 * A number beside a reading's or a quantity's value: the distance of a delta, the carrier of a marker, one neighbour of
 * several. A question may ask for one, and a method may go on with one, in place of the value.
 */
import { z } from 'zod';
import type { Unit } from '$lib/units/unit';
import { positive } from './number';

/** Parts with a name of their own; its ending says the unit. */
export const partNames = [
	'frequencyHz',
	'timeS',
	'fromDbm',
	'toDbm',
	'lowerHz',
	'upperHz',
	'lowerDbm',
	'upperDbm',
	'carrierDbm',
	'noiseDbm',
	'carrierHz',
	'modulatingHz',
	'index',
	'widthS',
	'repetitionHz',
	'onS',
	'riseS',
	'fallS',
	'periodS',
	'marginDb'
] as const;

export const part = z.union(
	[
		z.enum(partNames),
		/** One neighbouring channel, dBc. */
		z.strictObject({ offsetHz: positive, side: z.enum(['lower', 'upper']) }),
		/** One harmonic, dBc. */
		z.strictObject({ n: z.int().min(2).max(21) })
	],
	{ error: `give one of ${partNames.join(', ')}, or offsetHz and side, or n` }
);
export type Part = z.infer<typeof part>;

const ENDINGS: [RegExp, Unit][] = [
	[/Hz$/, 'Hz'],
	[/Dbm$/, 'dBm'],
	[/Db$/, 'dB'],
	[/S$/, 's']
];

/** The unit a part is in: dBc for a channel or a harmonic, else what its name ends in. */
export function unitOfPart(asked: Part): Unit {
	if (typeof asked !== 'string') return 'dBc';
	return ENDINGS.find(([ending]) => ending.test(asked))?.[1] ?? '1';
}

/** Widths and places of people's typing agree to this share. */
const SAME = 0.01;

/** The part's number among the parts of a reading or a truth; undefined when it has none such. */
export function partOf(parts: unknown, asked: Part): number | undefined {
	if (typeof asked === 'string') {
		const value = (parts as Partial<Record<string, unknown>> | undefined)?.[asked];
		return typeof value === 'number' ? value : undefined;
	}
	const several = Array.isArray(parts) ? (parts as Record<string, number | string>[]) : [];
	const found = several.find((one) =>
		'n' in asked
			? one.n === asked.n
			: one.side === asked.side && Math.abs(Number(one.offsetHz) / asked.offsetHz - 1) < SAME
	);
	return typeof found?.dbc === 'number' ? found.dbc : undefined;
}
