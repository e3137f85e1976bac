/**
 * What lies on a bench besides its set-up and its evidence: markers, readings that follow the traces, the unit levels are
 * shown in. `PUT /api/attempts/[id]/markings` keeps it with the attempt, for a reload and for another device.
 */
import { z } from 'zod';
import { finite, frequency } from './number';
import { readingRequest } from './reading';

export const markerLetters = ['A', 'B', 'C', 'D', 'E', 'F', 'G', 'H'] as const;
/** What levels may be shown in: at 50 Ω; the last by way of an antenna table. */
export const levelUnits = ['dBm', 'dBµV', 'dBmV', 'V', 'W', 'dBµV/m'] as const;

const letter = z.enum(markerLetters);
const traceNumber = z.int().min(1).max(4);
const marker = z.strictObject({
	letter,
	/** Place on the axis: Hz, or s in span 0; of no meaning for one that follows. */
	at: finite,
	trace: traceNumber,
	/** The marker it is read from. */
	from: letter.optional(),
	follows: z.literal('peak').optional()
});
const keptReading = z.strictObject({
	request: readingRequest,
	trace: traceNumber,
	/** As its form had them. */
	values: z.record(z.string().max(40), finite)
});

/** An antenna's factor over frequency, dB/m: linear between the points, flat outside. */
export const antennaTable = z
	.array(z.strictObject({ frequencyHz: frequency, dbPerM: finite.min(-100).max(200) }))
	.min(1)
	.max(200)
	.refine((points) => points.every((p, i) => i === 0 || p.frequencyHz > points[i - 1].frequencyHz), {
		message: 'frequencyHz must rise from point to point'
	});

export const markings = z.strictObject({
	markers: z
		.array(marker)
		.max(8)
		.refine((list) => new Set(list.map((one) => one.letter)).size === list.length, {
			message: 'each letter stands once'
		}),
	selected: letter.nullable(),
	readings: z.array(keptReading).max(24),
	levelUnit: z.enum(levelUnits),
	antenna: antennaTable.nullable()
});

export const markingsRequest = z.strictObject({ markings });
export const markingsResponse = z.strictObject({ savedAt: z.iso.datetime() });

export type LevelUnit = (typeof levelUnits)[number];
export type AntennaTable = z.infer<typeof antennaTable>;
export type Markings = z.infer<typeof markings>;
export type MarkingsRequest = z.infer<typeof markingsRequest>;
export type MarkingsResponse = z.infer<typeof markingsResponse>;
