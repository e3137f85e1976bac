/** The bench on the front page, which needs no account: what it shows, and what it asks the server. */
import { z } from 'zod';
import { findingMistake, measured, verdicts } from './questions/finding';
import { frequency } from './number';

const token = z.string().min(1).max(400);
/** Index into the resolutions offered. */
const choice = z.int().min(0).max(20);
/** Sweeps that one try may draw: some minutes of looking. */
export const MAX_TRIAL_ROWS = 5000;
const row = z.int().min(0).max(MAX_TRIAL_ROWS);

/** One sweep of the signal. */
export const trialSweep = z.strictObject({ choice, row, levelsDbm: z.array(z.number()) });

export const trialView = z.strictObject({
	/** The seed, sealed: whoever holds it can have the signal swept, and not know it. */
	token: z.string(),
	/** "How far apart are these two carriers?" */
	question: z.string(),
	unit: z.string(),
	units: z.array(z.string()),
	toleranceText: z.string(),
	startHz: z.number(),
	stopHz: z.number(),
	referenceDbm: z.number(),
	/** Resolution bandwidths offered, Hz, from wide to narrow; the one it starts with. */
	resolutionsHz: z.array(z.number()),
	first: trialSweep,
	exercise: z.strictObject({ slug: z.string(), title: z.string() })
});

/** `POST /api/trial/rows` */
export const trialRowRequest = z.strictObject({ token, choice, row });

/** `POST /api/trial/answers` */
export const trialAnswerRequest = z.strictObject({
	token,
	text: z.string().max(60),
	unit: z.string().min(1).max(16),
	/** The resolutions looked through, in order, the present one last, and how many sweeps were drawn with each. */
	looks: z
		.array(z.strictObject({ choice, sweeps: z.int().min(1).max(MAX_TRIAL_ROWS) }))
		.min(1)
		.max(100),
	/** The sweep on show, and the markers on it. */
	row,
	fromHz: frequency,
	toHz: frequency
});

export const trialFinding = z.strictObject({
	verdict: z.enum(verdicts),
	title: z.string(),
	yours: measured.nullable(),
	true: measured,
	difference: z.number().nullable(),
	mistakes: z.array(findingMistake),
	remarks: z.array(z.string())
});

export type TrialView = z.infer<typeof trialView>;
export type TrialSweep = z.infer<typeof trialSweep>;
export type TrialRowRequest = z.infer<typeof trialRowRequest>;
export type TrialAnswerRequest = z.infer<typeof trialAnswerRequest>;
export type TrialFinding = z.infer<typeof trialFinding>;
