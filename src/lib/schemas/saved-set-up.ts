/** Set-ups put by: under a name on the server (`/api/set-ups`), or in a file of one's own. */
import { z } from 'zod';
import { settings } from './settings';

/** Saved set-ups a person may have. */
export const mostSavedSetUps = 40;

const name = z
	.string()
	.trim()
	.min(1, 'give it a name')
	.max(60, 'must not be longer than 60 characters')
	.regex(/^[^\p{Cc}\p{Cf}\p{Zl}\p{Zp}]*$/u, 'must be one line of ordinary characters');

/** `POST /api/set-ups`: keeps it under this name, in place of one of the same name. */
export const saveSetUpRequest = z.strictObject({ name, settings });

export const savedSetUp = z.strictObject({
	id: z.int(),
	name: z.string(),
	settings,
	savedAt: z.iso.datetime()
});
/** `GET /api/set-ups`: by name. */
export const savedSetUpsResponse = z.strictObject({ setUps: z.array(savedSetUp) });
export const saveSetUpResponse = z.strictObject({ setUp: savedSetUp, replaced: z.boolean() });

/** The file that a set-up is downloaded as. */
export const setUpFile = z.strictObject({
	sweepwright: z.literal('set-up'),
	version: z.literal(1),
	/** The receiver it was set on; another one may refuse parts of it. */
	receiver: z.string().max(80),
	savedAt: z.iso.datetime(),
	settings
});

export type SavedSetUpView = z.infer<typeof savedSetUp>;
export type SaveSetUpRequest = z.infer<typeof saveSetUpRequest>;
export type SaveSetUpResponse = z.infer<typeof saveSetUpResponse>;
export type SavedSetUpsResponse = z.infer<typeof savedSetUpsResponse>;
export type SetUpFile = z.infer<typeof setUpFile>;
