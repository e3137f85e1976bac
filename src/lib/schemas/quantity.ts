/**
 * What can be asked of a scene: its exact quantities. Kinds and fields are those of the readings that would find them
 * (`reading.ts`), plus which emitters count and when. Unknown keys are refused by name.
 */
import { z } from 'zod';
import { finite, frequency, levelDbm, positive } from './number';

/** `emitters`: indices into the scene, absent = all. `atS`: bench time, for what drifts; absent = 0. */
const quantityOf = <K extends string, S extends z.ZodRawShape>(kind: K, fields: S) =>
	z.strictObject({
		kind: z.literal(kind),
		...fields,
		emitters: z.array(z.int().min(0)).min(1).optional(),
		atS: finite.min(0).optional()
	});

const channel = { centreHz: frequency, widthHz: positive };
const band = { startHz: frequency, stopHz: frequency };
const rising = { message: 'stopHz must be greater than startHz', path: ['stopHz'] };
const rises = (band: { startHz: number; stopHz: number }) => band.stopHz > band.startHz;
const limit = z.strictObject({ ...band, levelDbm }).refine(rises, rising);
const offset = z.strictObject({ offsetHz: positive, widthHz: positive });
const harmonicSeries = { fundamentalHz: positive.max(100e9), count: z.int().min(1).max(20) };

export const quantity = z.discriminatedUnion('kind', [
	quantityOf('marker', { atHz: frequency }),
	quantityOf('delta', { fromHz: frequency, toHz: frequency }),
	quantityOf('peak', {}),
	quantityOf('next-peak', { fromHz: frequency, side: z.enum(['lower', 'upper']) }),
	quantityOf('count', { atHz: frequency, gateS: positive.max(2000).optional() }),
	quantityOf('noise-density', { atHz: frequency }),
	quantityOf('band-power', band).refine(rises, rising),
	quantityOf('channel-power', channel),
	quantityOf('power-density', channel),
	quantityOf('occupied-bandwidth', {
		centreHz: frequency.optional(),
		widthHz: positive.optional(),
		percent: finite.gt(0).lt(100)
	}).refine((q) => (q.centreHz === undefined) === (q.widthHz === undefined), {
		message: 'a window needs centreHz and widthHz',
		path: ['centreHz']
	}),
	quantityOf('x-db-bandwidth', { db: finite.gt(0).max(200) }),
	quantityOf('adjacent-channel', {
		...channel,
		offsets: z.array(offset).min(1).max(12),
		/** Weights every channel with a root-raised-cosine filter of symbol rate `widthHz`. */
		rrcRollOff: finite.gt(0).max(1).optional()
	}),
	quantityOf('harmonics', harmonicSeries),
	quantityOf('thd', harmonicSeries),
	quantityOf('intercept', { lowerHz: frequency, upperHz: frequency }).refine((q) => q.upperHz > q.lowerHz, {
		message: 'upperHz must be greater than lowerHz',
		path: ['upperHz']
	}),
	quantityOf('carrier-to-noise', { carrierHz: frequency, widthHz: positive, noiseHz: frequency }),
	quantityOf('phase-noise', {
		carrierHz: frequency,
		offsetHz: finite.refine((value) => value !== 0, { message: 'must not be 0' })
	}),
	quantityOf('am-depth', { carrierHz: frequency }),
	quantityOf('fm-deviation', { carrierHz: frequency }),
	quantityOf('pulse', { carrierHz: frequency }),
	/** Level during the pulse, as a filter that lets all of it through would show it. */
	quantityOf('pulse-level', { carrierHz: frequency }),
	quantityOf('time', {}),
	quantityOf('mask', {
		limits: z.array(limit).min(1).max(100),
		/** Reference bandwidth the limits speak of; needed as soon as anything but lines is in view. */
		bandwidthHz: positive.optional()
	})
]);

/** A quantity of the scene. */
export type Quantity = z.infer<typeof quantity>;
export type QuantityKind = Quantity['kind'];
export type QuantityOf<K extends QuantityKind> = Extract<Quantity, { kind: K }>;
