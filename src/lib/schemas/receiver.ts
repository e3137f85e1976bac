/** A receiver profile: what the instrument is. Levels at the mixer unless said otherwise; null = ideal. */
import { z } from 'zod';
import { finite, frequency, positive } from './number';
import { phaseNoise } from './scene';

const rising = (points: { frequencyHz: number }[]) =>
	points.every((p, i) => i === 0 || p.frequencyHz > points[i - 1].frequencyHz);
const noiseFigureTable = z
	.array(z.strictObject({ frequencyHz: frequency, db: finite.min(0).max(100) }))
	.min(1)
	.refine(rising, { message: 'frequencyHz must rise from point to point' });

export const receiverProfile = z
	.strictObject({
		name: z.string().min(1).max(60),
		startHz: frequency,
		stopHz: frequency,
		noiseFigureDb: noiseFigureTable,
		preamp: z.strictObject({ gainDb: finite.min(0).max(60), noiseFigureDb: noiseFigureTable }).nullable(),
		attenuatorDb: z.array(finite.min(0).max(200)).min(1),
		maxSafeInputDbm: finite,
		toiDbm: finite.nullable(),
		shiDbm: finite.nullable(),
		phaseNoise: phaseNoise.nullable(),
		residuals: z.array(z.strictObject({ frequencyHz: frequency, levelDbm: finite })),
		loFeedthroughDbm: finite.optional(),
		referencePpm: finite.min(0),
		levelErrorDb: finite.min(0),
		rbwHz: z.array(positive).min(1)
	})
	.refine((p) => p.stopHz > p.startHz, { message: 'stopHz must be greater than startHz', path: ['stopHz'] });

export type ReceiverProfile = z.infer<typeof receiverProfile>;
export type NoiseFigureTable = z.infer<typeof noiseFigureTable>;
