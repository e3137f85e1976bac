/** What a set-up must be like, as data: checked on what the receiver did, not on what was typed. */
import { z } from 'zod';
import { detectors, scales, traceModes } from '../settings';
import { numberOrExpression } from '../template';
import { foreseen, slug } from './words';

/** Settings with a number, as the receiver resolves them. */
export const numberSettings = [
	'centreHz',
	'spanHz',
	'startHz',
	'stopHz',
	'points',
	'rbwHz',
	'vbwHz',
	'sweepTimeS',
	'referenceDbm',
	'attenuationDb',
	'padDb'
] as const;
export type NumberSetting = (typeof numberSettings)[number];

const conditionOf = <K extends string, S extends z.ZodRawShape>(kind: K, fields: S) =>
	z.strictObject({
		kind: z.literal(kind),
		/** Names the condition where mistakes are listed; absent: its setting, else its kind. */
		id: slug.optional(),
		/** Said of a set-up that doesn't hold it, beside what was asked and what was found. */
		broken: foreseen.optional(),
		...fields
	});
const isOneOf = <T extends [string, ...string[]]>(values: T) =>
	z.union([z.enum(values), z.array(z.enum(values)).min(1)]);

export const condition = z.discriminatedUnion('kind', [
	conditionOf('setting-within', {
		setting: z.enum(numberSettings),
		atLeast: numberOrExpression.optional(),
		atMost: numberOrExpression.optional()
	}).refine(({ atLeast, atMost }) => atLeast !== undefined || atMost !== undefined, {
		message: 'give atLeast, atMost or both',
		path: ['atLeast']
	}),
	conditionOf('detector-is', { is: isOneOf([...detectors]) }),
	conditionOf('scale-is', { is: isOneOf([...scales]) }),
	/** Of any of its traces; `sweeps`: at least so many went into it. */
	conditionOf('trace-is', { is: isOneOf([...traceModes]), sweeps: numberOrExpression.optional() }),
	conditionOf('preamp-is', { on: z.boolean() }),
	conditionOf('dc-block-is', { in: z.boolean() }),
	/** What the correction adds back at a frequency, dB. */
	conditionOf('correction-within', {
		atHz: numberOrExpression,
		atLeast: numberOrExpression,
		atMost: numberOrExpression
	}),
	/** Everything between two frequencies is on the screen, with this share of the span free at either side. */
	conditionOf('in-view', {
		fromHz: numberOrExpression,
		toHz: numberOrExpression,
		freeShare: numberOrExpression.optional()
	}),
	/** The sweep takes at least the time that its filters need. */
	conditionOf('unhurried', {}),
	/** The receiver doesn't warn of overload. */
	conditionOf('no-overload', {}),
	/** Mean power that the receiver's own noise shows, so far below a level at the reference plane. */
	conditionOf('own-noise-below', {
		atHz: numberOrExpression,
		levelDbm: numberOrExpression,
		db: numberOrExpression
	}),
	/** Third-order products of the receiver's own mixer from two tones of this level, so far below them. */
	conditionOf('own-products-below', {
		atHz: numberOrExpression,
		toneDbm: numberOrExpression,
		db: numberOrExpression
	})
]);
export type Condition = z.infer<typeof condition>;
