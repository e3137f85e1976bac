import { parseExercise } from '$lib/server/bench/exercise/parse-exercise';
import type { Exercise } from '$lib/schemas/exercise';

/** An exercise as an author would write it, quick to sweep: a spread carrier behind a lead, sometimes with a neighbour. */
const WRITTEN = {
	slug: 'spread-carrier',
	title: 'Power of a spread carrier',
	client: 'Northmoor Telemetry',
	situation: 'The lead loses **{leadLossDb | 1} dB**. Measure at the coupler’s port.',
	plane: 'the coupler’s port',
	chain: [
		{ part: 'box', label: 'Transmitter' },
		{ part: 'plane', label: 'answer for this plane' },
		{ part: 'lead', label: '{leadLossDb | 1} dB lead' },
		{ part: 'box', label: 'Receiver' }
	],
	leads: [{ label: 'Lead', loss: [{ frequencyHz: 450e6, lossDb: '=leadLossDb' }] }],
	cautions: ['Greatest input +27 dBm. Check for DC first.'],
	receiver: 'field',
	parameters: {
		carrierDbm: { draw: 'uniform', from: -30, to: -20 },
		leadLossDb: { draw: 'step', from: 4, to: 6, step: 0.1 },
		rateHz: { draw: 'uniform', from: 90e3, to: 110e3 },
		neighbour: { draw: 'choice', of: ['none', 'carrier'] }
	},
	shown: ['leadLossDb'],
	scene: {
		emitters: [
			{
				kind: 'digital',
				frequencyHz: 450e6,
				levelDbm: '=carrierDbm',
				symbolRateHz: '=rateHz',
				rollOff: 0.25,
				order: 4
			},
			{ kind: 'cw', when: { neighbour: 'carrier' }, frequencyHz: 450.4e6, levelDbm: '=carrierDbm' }
		],
		path: [{ frequencyHz: 450e6, lossDb: '=leadLossDb' }]
	},
	start: { centreHz: 450e6, spanHz: 1e6, rbwHz: 30e3, points: 101 },
	questions: [
		{
			id: 'power',
			text: 'Channel power at the coupler’s port',
			quantity: { kind: 'channel-power', centreHz: 450e6, widthHz: 200e3 },
			unit: 'dBm',
			tolerance: { absolute: 1.2 },
			digits: 1,
			mistakes: [{ kind: 'lead-left-out' }]
		},
		{
			id: 'width',
			text: 'Occupied bandwidth, 99 %',
			quantity: { kind: 'occupied-bandwidth', centreHz: 450e6, widthHz: 200e3, percent: 99 },
			unit: 'Hz',
			tolerance: { relative: 0.1 },
			digits: 0,
			mistakes: [{ kind: 'marker-as-power' }]
		}
	],
	hints: ['Which reading adds the slices up?', 'What has the lead done?'],
	method: [
		{
			do: 'set',
			settings: { detector: 'average', scale: 'power', correctionDb: '=leadLossDb', points: 501 }
		},
		{ do: 'sweep', sweeps: 20 },
		{ do: 'read', reading: { kind: 'channel-power', centreHz: 450e6, widthHz: 200e3 }, as: 'powerDbm' },
		{ do: 'answer', question: 'power', value: '=powerDbm', reading: 'powerDbm' },
		{
			do: 'read',
			reading: { kind: 'occupied-bandwidth', centreHz: 450e6, widthHz: 200e3, percent: 99 },
			as: 'widthHz'
		},
		{ do: 'answer', question: 'width', value: '=widthHz', reading: 'widthHz' }
	],
	benchTimeS: 600,
	tries: 3
};

/** The exercise, checked as content is, with these fields in place of its own. */
export const exerciseDefinition = (over: Partial<Record<keyof Exercise, unknown>> = {}): Exercise =>
	parseExercise({ ...WRITTEN, ...over });
