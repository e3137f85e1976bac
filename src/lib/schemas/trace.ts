/** A trace as it crosses the wire: what the command line's `read` takes. */
import { z } from 'zod';
import { finite, frequency, positive } from './number';
import { correctionTable, detectors, scales, traceModes } from './settings';

export const trace = z
	.strictObject({
		startHz: frequency,
		stopHz: frequency,
		rbwHz: positive,
		vbwHz: positive.optional(),
		sweepTimeS: positive.optional(),
		detector: z.enum(detectors),
		scale: z.enum(scales),
		mode: z.enum(traceModes).optional(),
		count: z.int().min(1).optional(),
		correctionDb: z.union([finite, correctionTable]).optional(),
		levelsDbm: z.array(finite.min(-1000).max(1000)).min(2).max(10001)
	})
	.refine((t) => t.stopHz >= t.startHz, {
		message: 'stopHz must not be less than startHz',
		path: ['stopHz']
	});

export type TraceInput = z.infer<typeof trace>;
