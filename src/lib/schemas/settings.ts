/**
 * What a person sets on the bench, as typed: every field optional, "auto" where physics couples it.
 * Limits that depend on the receiver (its resolution bandwidths, its range) are checked by the bench, which refuses by name.
 */
import { z } from 'zod';
import { finite, frequency, positive } from './number';

export const detectors = ['rise-fall', 'positive-peak', 'negative-peak', 'sample', 'average'] as const;
export const scales = ['log', 'power', 'voltage'] as const;
export const traceModes = ['live', 'max-hold', 'min-hold', 'average', 'kept'] as const;

const auto = z.literal('auto');
export const inputSettings = z.strictObject({
	connected: z.boolean().optional(),
	padDb: z.union([z.literal(0), z.literal(10), z.literal(20), z.literal(30)]).optional(),
	dcBlock: z.boolean().optional()
});
export const traceSettings = z.strictObject({
	mode: z.enum(traceModes),
	count: z.int().min(1).max(10000).optional()
});
export const correctionTable = z
	.array(z.strictObject({ frequencyHz: frequency, db: finite.min(-200).max(200) }))
	.min(1)
	.refine((points) => points.every((p, i) => i === 0 || p.frequencyHz > points[i - 1].frequencyHz), {
		message: 'frequencyHz must rise from point to point'
	});
export const settings = z.strictObject({
	centreHz: frequency.optional(),
	spanHz: frequency.optional(),
	startHz: frequency.optional(),
	stopHz: frequency.optional(),
	rbwHz: z.union([positive, auto]).optional(),
	vbwHz: z.union([positive, auto]).optional(),
	sweepTimeS: z.union([positive, auto]).optional(),
	points: z
		.int({ error: 'must be a whole number' })
		.min(101, 'must be at least 101')
		.max(10001, 'must be at most 10001')
		.optional(),
	detector: z.union([auto, z.enum(detectors)]).optional(),
	scale: z.enum(scales).optional(),
	referenceDbm: finite.min(-170, 'must be at least −170 dBm').max(60, 'must be at most 60 dBm').optional(),
	attenuationDb: z.union([finite.min(0), auto]).optional(),
	preamp: z.boolean().optional(),
	correctionDb: z
		.union([finite.min(-200, 'must be at least −200 dB').max(200, 'must be at most 200 dB'), correctionTable])
		.optional(),
	input: inputSettings.optional(),
	traces: z.array(traceSettings).min(1).max(4).optional()
});

export type Detector = (typeof detectors)[number];
export type Scale = (typeof scales)[number];
export type TraceMode = (typeof traceModes)[number];
export type TraceSettings = z.infer<typeof traceSettings>;
export type CorrectionTable = z.infer<typeof correctionTable>;
/** Settings as typed. */
export type Settings = z.infer<typeof settings>;
/** Settings with every coupling resolved: what the receiver really does. Made by `resolveSettings` in the bench. */
export interface ResolvedSettings {
	startHz: number;
	stopHz: number;
	centreHz: number;
	spanHz: number;
	points: number;
	rbwHz: number;
	vbwHz: number;
	sweepTimeS: number;
	detector: Detector;
	scale: Scale;
	referenceDbm: number;
	attenuationDb: number;
	preamp: boolean;
	correctionDb: number | CorrectionTable;
	input: { connected: boolean; padDb: number; dcBlock: boolean };
	traces: { mode: TraceMode; count: number }[];
	/** Which fields automatic coupling chose. */
	auto: { rbwHz: boolean; vbwHz: boolean; sweepTimeS: boolean; detector: boolean; attenuationDb: boolean };
	/** The sweep time that automatic coupling would choose, s. */
	autoSweepTimeS: number;
}
/** The same as it crosses the wire: made by our own server, so that only its being there is checked. */
export const resolvedSettings = z.custom<ResolvedSettings>(
	(value) => typeof value === 'object' && value !== null
);
