/**
 * A live figure in a lesson: a scene on a receiver, and the settings that the reader may turn.
 * Written in lesson.md as a fenced block of the language `figure`, YAML inside. Plain numbers in the units of their names.
 */
import { z } from 'zod';
import { finite } from './number';
import { readingRequest } from './reading';
import { scene } from './scene';
import { settings } from './settings';

/** What a reader may turn: any setting that is one value, and what is done at the input or with the first trace. */
export const controlSettings = [
	'centreHz',
	'spanHz',
	'startHz',
	'stopHz',
	'rbwHz',
	'vbwHz',
	'sweepTimeS',
	'points',
	'detector',
	'scale',
	'referenceDbm',
	'attenuationDb',
	'preamp',
	'correctionDb',
	'padDb',
	'dcBlock',
	'connected',
	'traceMode'
] as const;

const MOST_POINTS = 250_000;
const line = (most: number) => z.string().trim().min(1).max(most);

/** One value that a control can stand at: a number in the setting's unit, "auto", a word, true or false. */
export const figureChoice = z.union([finite, z.boolean(), z.string().min(1).max(40)], {
	error: 'must be a number, a word, true or false'
});
export const figureControl = z.strictObject({
	setting: z.enum(controlSettings),
	label: line(40),
	choices: z
		.array(figureChoice)
		.min(2)
		.max(8)
		.refine((choices) => new Set(choices).size === choices.length, 'has a choice twice')
});
export const figure = z
	.strictObject({
		/** Unique in the lesson. */
		id: z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'lower-case words joined by hyphens'),
		caption: line(300),
		receiver: z.enum(['field', 'modest']),
		scene,
		settings,
		/** Rows made at once, held or averaged as the traces say. */
		sweeps: z.int().min(1).max(400).default(1),
		seed: z.int().min(0).max(Number.MAX_SAFE_INTEGER),
		controls: z
			.array(figureControl)
			.min(1)
			.max(3)
			.refine(
				(controls) => new Set(controls.map(({ setting }) => setting)).size === controls.length,
				'turns one setting twice'
			),
		/** Taken off trace 1. */
		readings: z.array(readingRequest).max(3).default([]),
		/** What is drawn below the reference level, dB. */
		rangeDb: finite.min(10).max(140).default(80)
	})
	.refine(({ sweeps, settings: { points = 1001 } }) => sweeps * points <= MOST_POINTS, {
		message: `sweeps × points must be at most ${MOST_POINTS}: a reader is waiting`,
		path: ['sweeps']
	});

export type ControlSetting = (typeof controlSettings)[number];
export type FigureChoice = z.infer<typeof figureChoice>;
export type FigureControl = z.infer<typeof figureControl>;
export type Figure = z.infer<typeof figure>;
