/** The scene: what is on the cable. SI units in the names; levels in dBm; unknown keys are refused by name. */
import { z } from 'zod';
import { finite, positive, frequency, levelDbm } from './number';

const phaseNoisePoint = z.strictObject({ offsetHz: positive, dbcPerHz: finite.max(0) });
/** Single-sideband phase noise, offsets rising; straight in dB over log offset between the points. */
export const phaseNoise = z
	.array(phaseNoisePoint)
	.min(1)
	.refine((points) => points.every((p, i) => i === 0 || p.offsetHz > points[i - 1].offsetHz), {
		message: 'offsetHz must rise from point to point'
	});

const gate = z.strictObject({ onS: positive, offS: positive, startS: finite.optional() });
const hop = z.strictObject({ channelsHz: z.array(frequency).min(1).max(256), dwellS: positive });
const drift = z.strictObject({ hzPerS: finite });
const timing = { gate: gate.optional(), hop: hop.optional(), drift: drift.optional() };
const carrier = { frequencyHz: frequency, levelDbm };

export const cw = z.strictObject({
	kind: z.literal('cw'),
	...carrier,
	phaseNoise: phaseNoise.optional(),
	...timing
});
export const am = z.strictObject({
	kind: z.literal('am'),
	...carrier,
	modulatingHz: positive,
	depth: finite.min(0).max(1),
	...timing
});
export const fm = z.strictObject({
	kind: z.literal('fm'),
	...carrier,
	modulatingHz: positive,
	deviationHz: finite.min(0),
	...timing
});
export const pm = z.strictObject({
	kind: z.literal('pm'),
	...carrier,
	modulatingHz: positive,
	deviationRad: finite.min(0),
	...timing
});
export const digital = z.strictObject({
	kind: z.literal('digital'),
	...carrier,
	symbolRateHz: positive,
	rollOff: finite.min(0.01).max(1),
	order: z.union([z.literal(2), z.literal(4), z.literal(16), z.literal(64), z.literal(256)]),
	...timing
});
export const msk = z.strictObject({
	kind: z.literal('msk'),
	...carrier,
	bitRateHz: positive,
	bt: finite.min(0.1).max(10).optional(),
	...timing
});
export const multicarrier = z.strictObject({
	kind: z.literal('multicarrier'),
	...carrier,
	subcarriers: z.int().min(2).max(4096),
	spacingHz: positive,
	...timing
});
export const noise = z
	.strictObject({
		kind: z.literal('noise'),
		densityDbmPerHz: finite.min(-250).max(50),
		startHz: frequency,
		stopHz: frequency
	})
	.refine((e) => e.stopHz > e.startHz, { message: 'stopHz must be greater than startHz', path: ['stopHz'] });
export const pulsed = z
	.strictObject({ kind: z.literal('pulsed'), ...carrier, widthS: positive, periodS: positive, ...timing })
	.refine((e) => e.periodS > e.widthS, { message: 'periodS must be greater than widthS', path: ['periodS'] });
export const dc = z.strictObject({ kind: z.literal('dc'), volts: finite });

export const emitter = z.discriminatedUnion('kind', [
	cw,
	am,
	fm,
	pm,
	digital,
	msk,
	multicarrier,
	noise,
	pulsed,
	dc
]);
export const device = z.strictObject({
	toiDbm: finite.nullable(),
	shiDbm: finite.nullable(),
	phaseRad: finite.optional()
});
/** A loss or correction table: straight between points, flat outside. */
export const lossTable = z
	.array(z.strictObject({ frequencyHz: frequency, lossDb: finite.min(-100).max(200) }))
	.min(1)
	.refine((points) => points.every((p, i) => i === 0 || p.frequencyHz > points[i - 1].frequencyHz), {
		message: 'frequencyHz must rise from point to point'
	});
export const scene = z.strictObject({
	emitters: z.array(emitter).max(200),
	device: device.optional(),
	path: lossTable.optional()
});

export type PhaseNoisePoint = z.infer<typeof phaseNoisePoint>;
export type Gate = z.infer<typeof gate>;
export type Hop = z.infer<typeof hop>;
export type Emitter = z.infer<typeof emitter>;
export type EmitterOf<K extends Emitter['kind']> = Extract<Emitter, { kind: K }>;
export type Device = z.infer<typeof device>;
export type LossTable = z.infer<typeof lossTable>;
export type Scene = z.infer<typeof scene>;
