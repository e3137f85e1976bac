import type { Exercise } from '$lib/schemas/exercise';
import { exerciseDefinition } from './exercise';

const FOREIGN = { title: 'That is something else', text: 'It stands elsewhere.' };
/** Marks, an order, a table and an uncertainty, on three carriers: quick to sweep. */
export const MORE_QUESTIONS = {
	parameters: {
		carrierDbm: { draw: 'uniform', from: -30, to: -20 },
		leadLossDb: { draw: 'step', from: 4, to: 6, step: 0.1 },
		apartHz: { draw: 'step', from: 180e3, to: 220e3, step: 1e3 },
		aboveDb: { draw: 'step', from: 8, to: 12, step: 0.5 },
		neighbour: { draw: 'choice', of: ['weak', 'weaker'] }
	},
	derived: { belowHz: '=450e6 - apartHz', aboveHz: '=450e6 + apartHz' },
	scene: {
		emitters: [
			{ kind: 'cw', frequencyHz: 450e6, levelDbm: '=carrierDbm' },
			{ kind: 'cw', frequencyHz: '=aboveHz', levelDbm: '=carrierDbm - aboveDb' },
			{ kind: 'cw', when: { neighbour: 'weak' }, frequencyHz: '=belowHz', levelDbm: '=carrierDbm - 20' },
			{ kind: 'cw', when: { neighbour: 'weaker' }, frequencyHz: '=belowHz', levelDbm: '=carrierDbm - 30' }
		],
		path: [{ frequencyHz: 450e6, lossDb: '=leadLossDb' }]
	},
	questions: [
		{
			id: 'carrier',
			type: 'mark',
			shape: 'flag',
			text: 'Mark the carrier above the strongest',
			quantity: { kind: 'marker', atHz: '=aboveHz' },
			tolerance: { absolute: 5e3 },
			mistakes: [{ id: 'strongest', atHz: 450e6, ...FOREIGN }]
		},
		{
			id: 'band',
			type: 'mark',
			shape: 'band',
			text: 'Mark the channel of 50 kHz about the strongest',
			quantity: { kind: 'channel-power', centreHz: 450e6, widthHz: 50e3 },
			tolerance: { relative: 0.1 },
			mistakes: [{ id: 'half-a-width', atHz: 449.9875e6, toHz: 450.0125e6, ...FOREIGN }]
		},
		{
			id: 'levels',
			type: 'order',
			text: 'Put the carriers in order of their level, the strongest first',
			truths: { belowDbm: { kind: 'marker', atHz: '=belowHz' } },
			first: 'greatest',
			apart: 3,
			items: [
				{ id: 'middle', text: 'The one in the middle', by: '=carrierDbm' },
				{ id: 'above', text: 'The one above', by: '=carrierDbm - aboveDb' },
				{ id: 'below', text: 'The one below', by: '=belowDbm' }
			],
			mistakes: [{ id: 'above-and-below', items: ['above', 'below'], ...FOREIGN }]
		},
		{
			id: 'table',
			type: 'emissions',
			text: 'List the two beside the strongest',
			toleranceHz: 5e3,
			toleranceDb: 1.5,
			emissions: [
				{ id: 'below', name: 'the one below', atHz: '=belowHz', breaks: { neighbour: 'weak' } },
				{ id: 'above', name: 'the one above', atHz: '=aboveHz', breaks: true }
			],
			ghosts: [{ id: 'own-spur', atHz: 450.4e6, ...FOREIGN }]
		},
		{
			id: 'stated',
			type: 'uncertainty',
			text: 'State the level of the strongest at the coupler’s port',
			quantity: { kind: 'marker', atHz: 450e6 },
			unit: 'dBm',
			toleranceDb: 1.2,
			digits: 1,
			within: 0.15,
			spreadDb: 0.01,
			budget: [
				{ id: 'receiver', text: 'the receiver’s level error', db: 0.7, law: 'rectangular' },
				{ id: 'lead', text: 'the lead’s calibration', db: 0.5, law: 'normal' }
			]
		}
	],
	method: [
		{ do: 'set', settings: { rbwHz: 10e3, points: 1001, correctionDb: '=leadLossDb' } },
		{ do: 'sweep', sweeps: 1 },
		{ do: 'read', reading: { kind: 'peak' }, as: 'strongestDbm' },
		{ do: 'read', reading: { kind: 'marker', atHz: '=aboveHz*displayedPerHz' }, as: 'aboveDbm' },
		{ do: 'read', reading: { kind: 'marker', atHz: '=belowHz*displayedPerHz' }, as: 'belowDbm' },
		{ do: 'answer', question: 'carrier', atHz: '=aboveHz*displayedPerHz' },
		{
			do: 'answer',
			question: 'levels',
			by: { middle: '=strongestDbm', above: '=aboveDbm', below: '=belowDbm' }
		},
		{
			do: 'answer',
			question: 'table',
			rows: [
				{ atHz: '=belowHz', levelDbm: '=belowDbm', breaks: '=belowDbm > strongestDbm - 25' },
				{ atHz: '=aboveHz', levelDbm: '=aboveDbm', breaks: true }
			]
		},
		{
			do: 'answer',
			question: 'stated',
			value: '=strongestDbm',
			reading: 'strongestDbm',
			expandedDb: '=2*sqrt(0.7^2/3 + 0.25^2)',
			k: 2
		},
		{ do: 'answer', question: 'band', atHz: '=449.975e6*displayedPerHz', toHz: '=450.025e6*displayedPerHz' }
	]
};

/** The exercise that asks them, with these fields in place of its own. */
export const moreExercise = (over: Partial<Record<keyof Exercise, unknown>> = {}): Exercise =>
	exerciseDefinition({ ...MORE_QUESTIONS, ...over });
