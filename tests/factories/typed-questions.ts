import type { Exercise } from '$lib/schemas/exercise';
import { exerciseDefinition } from './exercise';

/** Questions that ask for no number, one of each type, on the scene of the ordinary exercise: quick to sweep. */
export const TYPED_QUESTIONS = {
	questions: [
		{
			id: 'beside',
			type: 'choice',
			pick: 'one',
			text: 'What stands 400 kHz above the spread carrier?',
			options: [
				{ id: 'nothing', text: 'Nothing', right: { neighbour: 'none' } },
				{
					id: 'carrier',
					text: 'A carrier',
					right: { neighbour: 'carrier' },
					chosen: { title: 'There is none', text: 'The trace is as low there as anywhere.' }
				},
				{ id: 'noise', text: 'A band of noise', right: false }
			],
			looked: [
				{
					conditions: [{ kind: 'in-view', fromHz: 450.4e6, toHz: 450.4e6 }],
					missing: 'You never looked there.'
				}
			]
		},
		{
			id: 'true-of-it',
			type: 'choice',
			pick: 'several',
			inOrder: true,
			text: 'Which of these are true?',
			truths: { powerDbm: { kind: 'channel-power', centreHz: 450e6, widthHz: 200e3 } },
			options: [
				{ id: 'spread', text: 'Its power is spread over a band', right: true },
				{ id: 'strong', text: 'It is stronger than −25 dBm', right: '=powerDbm > -25' },
				{ id: 'pulsed', text: 'It comes and goes', right: false }
			]
		},
		{
			id: 'settled',
			type: 'set-up',
			text: 'Set up for its power, and put that set-up in',
			conditions: [
				{ kind: 'detector-is', is: 'average' },
				{ kind: 'scale-is', is: 'power' },
				{ kind: 'setting-within', setting: 'rbwHz', atMost: 30e3 },
				{ kind: 'unhurried' },
				{
					kind: 'no-overload',
					id: 'straight',
					broken: { title: 'Too much at the mixer', text: 'Put attenuation in.' }
				},
				{ kind: 'own-noise-below', atHz: 450e6, levelDbm: '=carrierDbm', db: 30 }
			],
			mistakes: [
				{ id: 'peaks', settings: { detector: 'positive-peak' }, breaks: ['detector-is'] },
				{ id: 'hurried', settings: { sweepTimeS: 0.001 }, breaks: ['unhurried'] }
			]
		}
	],
	method: [
		{ do: 'set', settings: { detector: 'average', scale: 'power', correctionDb: '=leadLossDb' } },
		{ do: 'sweep', sweeps: 2 },
		{ do: 'answer', question: 'settled', why: 'Averages of power are right for what is spread.' },
		{ do: 'read', reading: { kind: 'marker', atHz: 450.4e6 }, as: 'besideDbm' },
		{ do: 'read', reading: { kind: 'channel-power', centreHz: 450e6, widthHz: 200e3 }, as: 'powerDbm' },
		{
			do: 'answer',
			question: 'beside',
			chosen: { carrier: '=besideDbm > -45', nothing: '=besideDbm <= -45' }
		},
		{ do: 'answer', question: 'true-of-it', chosen: { spread: true, strong: '=powerDbm > -25' } }
	]
};

/** The exercise that asks them, with these fields in place of its own. */
export const typedExercise = (over: Partial<Record<keyof Exercise, unknown>> = {}): Exercise =>
	exerciseDefinition({ ...TYPED_QUESTIONS, ...over });
