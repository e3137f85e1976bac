/**
 * `POST /api/attempts/[id]/sweeps`: what asks for sweeps, and the JSON that travels among the rows (schemas/frames.ts).
 * A stream is: one `state`, pieces of rows, one `end`. A stream that stops without an `end` was cut: ask again with `from`.
 */
import { z } from 'zod';
import { digits } from './number';
import { settings, type ResolvedSettings } from './settings';

export const rowNumber = z
	.int()
	.min(0)
	.max(2 ** 32 - 2);

export const sweepsRequest = z.strictObject({
	/** As typed. The same as the current set-up: the log goes on. Anything else: a new entry in the log. */
	settings,
	/** The first row the client has not drawn whole. Every earlier row of the current set-up counts as acknowledged. */
	from: rowNumber,
	/** Stop after this many rows. Absent: until the client goes away, the set-up changes or the receiver time is used up. */
	sweeps: z.int().min(1).max(10_000).optional(),
	/** Puts the receiver back on after its input protection tripped. */
	resetProtection: z.boolean().optional()
});

/** A warning of the receiver; `db` is how far a too fast sweep reads low. The others keep their figures: they would tell the level. */
export const receiverFlag = z.strictObject({
	kind: z.enum(['too-fast', 'overload', 'input-protection']),
	db: z.number().optional()
});

/** The first frame of a stream. */
export const streamState = z.strictObject({
	/** Number of the set-up in the attempt's log, from 0. */
	setUp: z.int(),
	/** First row swept with this set-up, and the bench clock when it began. */
	firstRow: rowNumber,
	clockS: z.number(),
	/** The first row of this stream. */
	fromRow: rowNumber,
	/** Where holds and averages start: combine the rows from here on that were drawn. */
	restartRow: rowNumber,
	resolved: z.custom<ResolvedSettings>((value) => typeof value === 'object' && value !== null),
	flags: z.array(receiverFlag),
	/** Bench time of one sweep, s, without the retrace. */
	sweepDurationS: z.number(),
	/** Bench seconds per real second: above 1 for long sweeps. */
	speedUp: z.number(),
	benchTimeUsedS: z.number(),
	benchTimeS: z.number()
});

export const streamEndReasons = [
	/** The rows asked for have been sent. */
	'done',
	/** Another request for sweeps of this attempt has taken the receiver: a new set-up, another tab, another device. */
	'taken-over',
	'input-protection',
	/** The exercise's receiver time is used up. */
	'bench-time-used',
	/** The attempt was handed in. */
	'closed',
	/** The server is going away: ask again with `from`. */
	'server-stopping'
] as const;

/** The last frame of a stream. */
export const streamEnd = z.strictObject({
	reason: z.enum(streamEndReasons),
	message: z.string(),
	nextRow: rowNumber,
	benchTimeUsedS: z.number()
});

/** 409 when `from` cannot be served: load the attempt again and go on from there. */
export const sweepsConflict = z.strictObject({ message: z.string(), nextRow: rowNumber });

/** `GET /api/attempts/[id]/rows?from=&to=`: rows already drawn, as the same frames, at once and free of receiver time. */
export const rowsQuery = z
	.strictObject({ from: digits.pipe(rowNumber), to: digits.pipe(rowNumber) })
	.refine((q) => q.to >= q.from, { message: 'to must not be less than from', path: ['to'] });

export const acknowledgementRequest = z.strictObject({
	/** This row and every earlier one of its set-up were drawn whole. */
	row: rowNumber
});
export const acknowledgementResponse = z.strictObject({ drawnTo: rowNumber });

export type SweepsRequest = z.infer<typeof sweepsRequest>;
export type ReceiverFlag = z.infer<typeof receiverFlag>;
export type StreamState = z.infer<typeof streamState>;
export type StreamEndReason = (typeof streamEndReasons)[number];
export type StreamEnd = z.infer<typeof streamEnd>;
export type SweepsConflict = z.infer<typeof sweepsConflict>;
export type AcknowledgementRequest = z.infer<typeof acknowledgementRequest>;
export type AcknowledgementResponse = z.infer<typeof acknowledgementResponse>;
