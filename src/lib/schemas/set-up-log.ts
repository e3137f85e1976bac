/** `GET /api/attempts/[id]/set-ups`: what was set on this bench so far, oldest first, and the rows drawn with it. */
import { z } from 'zod';
import { resolvedSettings, settings } from './settings';
import { rowNumber } from './sweep-stream';

export const loggedSetUp = z.strictObject({
	/** From 0 within the attempt. */
	number: z.int(),
	/** What changed, in words: "Centre 450 MHz, span 100 kHz". */
	text: z.string(),
	/** As typed, and as the receiver did it. */
	settings,
	resolved: resolvedSettings,
	/** Rows that were drawn with it; null when none was. */
	rows: z.strictObject({ from: rowNumber, to: rowNumber }).nullable(),
	at: z.iso.datetime()
});
export const setUpsResponse = z.strictObject({ setUps: z.array(loggedSetUp) });

export type LoggedSetUp = z.infer<typeof loggedSetUp>;
export type SetUpsResponse = z.infer<typeof setUpsResponse>;
