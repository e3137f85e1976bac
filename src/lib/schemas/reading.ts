/** What can be asked of a trace, as it crosses the wire: commands, evidence, exercises. Unknown keys are refused by name. */
import { z } from 'zod';
import { finite, frequency, levelDbm, positive } from './number';

const kind = <K extends string>(name: K) => ({ kind: z.literal(name) });
const timeS = z.number().min(0).max(2000);
const channel = { centreHz: frequency, widthHz: positive };
const rising = { message: 'stopHz must be greater than startHz', path: ['stopHz'] };
const limit = z
	.strictObject({ startHz: frequency, stopHz: frequency, levelDbm })
	.refine((segment) => segment.stopHz > segment.startHz, rising);

export const marker = z
	.strictObject({ ...kind('marker'), atHz: frequency.optional(), atS: timeS.optional() })
	.refine((r) => (r.atHz === undefined) !== (r.atS === undefined), {
		message: 'give atHz, or atS in span 0',
		path: ['atHz']
	});
export const delta = z
	.strictObject({
		...kind('delta'),
		fromHz: frequency.optional(),
		toHz: frequency.optional(),
		fromS: timeS.optional(),
		toS: timeS.optional()
	})
	.refine(
		(r) => {
			const given = [r.fromHz, r.toHz, r.fromS, r.toS].map((value) => value !== undefined);
			return String(given) === 'true,true,false,false' || String(given) === 'false,false,true,true';
		},
		{ message: 'give fromHz and toHz, or fromS and toS in span 0', path: ['fromHz'] }
	);
export const peak = z.strictObject(kind('peak'));
export const nextPeak = z.strictObject({
	...kind('next-peak'),
	fromHz: frequency,
	side: z.enum(['lower', 'upper']),
	thresholdDbm: levelDbm.optional(),
	excursionDb: finite.min(0).max(200).optional()
});
export const minimum = z.strictObject(kind('minimum'));
export const noiseDensity = z.strictObject({ ...kind('noise-density'), atHz: frequency });
export const bandPower = z
	.strictObject({ ...kind('band-power'), startHz: frequency, stopHz: frequency })
	.refine((r) => r.stopHz > r.startHz, rising);
export const channelPower = z.strictObject({ ...kind('channel-power'), ...channel });
export const powerDensity = z.strictObject({ ...kind('power-density'), ...channel });
export const occupiedBandwidth = z
	.strictObject({
		...kind('occupied-bandwidth'),
		centreHz: frequency.optional(),
		widthHz: positive.optional(),
		percent: finite.gt(0).lt(100)
	})
	.refine((r) => (r.centreHz === undefined) === (r.widthHz === undefined), {
		message: 'a window needs centreHz and widthHz',
		path: ['centreHz']
	});
export const xDbBandwidth = z.strictObject({ ...kind('x-db-bandwidth'), db: finite.gt(0).max(200) });
export const adjacentChannel = z.strictObject({
	...kind('adjacent-channel'),
	...channel,
	offsets: z
		.array(z.strictObject({ offsetHz: positive, widthHz: positive }))
		.min(1)
		.max(12),
	rrcRollOff: finite.gt(0).max(1).optional()
});
const harmonic = { fundamentalHz: positive.max(100e9), count: z.int().min(1).max(20) };
export const harmonics = z.strictObject({ ...kind('harmonics'), ...harmonic });
export const thd = z.strictObject({ ...kind('thd'), ...harmonic });
export const intercept = z
	.strictObject({ ...kind('intercept'), lowerHz: frequency, upperHz: frequency })
	.refine((r) => r.upperHz > r.lowerHz, {
		message: 'upperHz must be greater than lowerHz',
		path: ['upperHz']
	});
export const carrierToNoise = z.strictObject({
	...kind('carrier-to-noise'),
	carrierHz: frequency,
	widthHz: positive,
	noiseHz: frequency
});
export const phaseNoiseReading = z.strictObject({
	...kind('phase-noise'),
	carrierHz: frequency,
	offsetHz: finite.refine((value) => value !== 0, { message: 'must not be 0' })
});
export const amDepth = z.strictObject({ ...kind('am-depth'), carrierHz: frequency });
export const fmDeviation = z.strictObject({ ...kind('fm-deviation'), carrierHz: frequency });
export const pulse = z.strictObject({ ...kind('pulse'), carrierHz: frequency });
export const time = z.strictObject(kind('time'));
export const maskLimits = z.array(limit).min(1).max(100);
export const mask = z.strictObject({ ...kind('mask'), limits: maskLimits });

/** A reading off a trace. */
export const readingRequest = z.discriminatedUnion('kind', [
	marker,
	delta,
	peak,
	nextPeak,
	minimum,
	noiseDensity,
	bandPower,
	channelPower,
	powerDensity,
	occupiedBandwidth,
	xDbBandwidth,
	adjacentChannel,
	harmonics,
	thd,
	intercept,
	carrierToNoise,
	phaseNoiseReading,
	amDepth,
	fmDeviation,
	pulse,
	time,
	mask
]);
/** A frequency count: no trace can give it, the bench takes it with a gate time of its own. */
export const countRequest = z.strictObject({ ...kind('count'), atHz: frequency, gateS: positive.max(2000) });

/** Everything a learner can ask for on the bench. */
export const benchRequest = z.discriminatedUnion('kind', [...readingRequest.options, countRequest]);

export type MaskLimits = z.infer<typeof maskLimits>;
export type ReadingRequest = z.infer<typeof readingRequest>;
export type CountRequest = z.infer<typeof countRequest>;
export type BenchRequest = z.infer<typeof benchRequest>;
