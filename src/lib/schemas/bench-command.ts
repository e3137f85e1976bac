/** What the bench's command line takes: one JSON object a verb. Unknown keys are refused by name. */
import { z } from 'zod';
import { countRequest, readingRequest } from './reading';
import { quantity } from './quantity';
import { receiverProfile } from './receiver';
import { scene } from './scene';
import { settings } from './settings';
import { trace } from './trace';

/** An integer 0…2⁵³−1 or a string. */
export const seed = z.union([z.int().min(0).max(Number.MAX_SAFE_INTEGER), z.string().min(1).max(200)], {
	error: 'must be a whole number from 0 to 2⁵³−1, or a string'
});
const bench = {
	scene,
	receiver: z.union([z.enum(['field', 'modest']), receiverProfile]).default('field'),
	settings: settings.default({}),
	seed: seed.default(1)
};

export const sweepInput = z.strictObject({ ...bench, sweeps: z.int().min(1).max(100_000).default(1) });
export const readInput = z.strictObject({ trace, reading: readingRequest });
/** A frequency count is taken at the receiver, not off a trace: it needs the bench. */
export const countInput = z.strictObject({
	...bench,
	sweeps: z.int().min(1).max(100_000).default(1),
	reading: countRequest
});
export const truthInput = z.strictObject({ scene, quantity });

export type SweepInput = z.infer<typeof sweepInput>;
export type CountInput = z.infer<typeof countInput>;
