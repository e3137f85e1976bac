/** A live figure as a page shows it, and as it asks for another choice. The scene is not part of it: rows are made on the server. */
import { z } from 'zod';
import { figureChoice, figureControl } from './figure';
import { readingRequest } from './reading';
import type { ResolvedSettings } from './settings';
import { receiverFlag } from './sweep-stream';

/** `POST /api/figures/[unitId]/[figureId]`: where each control stands, by the setting it turns. */
export const figureRequest = z.strictObject({ values: z.record(z.string().max(40), figureChoice) });

export const figureOutcome = z.union([
	z.strictObject({
		kind: z.string(),
		value: z.number(),
		unit: z.string(),
		/** One standard deviation of `value`, in `unit`. */
		spread: z.number(),
		remarks: z.array(z.strictObject({ code: z.string(), text: z.string() })),
		parts: z.unknown().optional()
	}),
	z.strictObject({ kind: z.string(), problem: z.string(), needs: z.string() })
]);

/** The figure at one choice of each control. */
export const figureState = z.strictObject({
	/** In the order of the controls. */
	values: z.array(figureChoice),
	resolved: z.custom<ResolvedSettings>((value) => typeof value === 'object' && value !== null),
	flags: z.array(receiverFlag),
	/** One for each of the set-up's; no levels where the input has protected itself. Hundredths of a dB. */
	traces: z.array(z.strictObject({ mode: z.string(), levelsDbm: z.array(z.number()) })),
	/** In the order of the requests; none where there is no trace to read. */
	readings: z.array(figureOutcome)
});

export const figureView = z.strictObject({
	id: z.string(),
	caption: z.string(),
	controls: z.array(figureControl),
	readings: z.array(readingRequest),
	/** What is drawn below the reference level, dB. */
	rangeDb: z.number(),
	start: figureState
});

export type FigureRequest = z.infer<typeof figureRequest>;
export type FigureOutcome = z.infer<typeof figureOutcome>;
export type FigureState = z.infer<typeof figureState>;
export type FigureView = z.infer<typeof figureView>;
