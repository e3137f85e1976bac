import { z } from 'zod';

/** What a mistake made with the lead is told: the lead's own loss, dB, where more than the lead stands between the plane and the connector. */
export const leadLoss = z.strictObject({ lossDb: z.number().positive().optional() });
