import type { Exercise } from '$lib/schemas/exercise';
import { parseExercise } from '$lib/server/bench/exercise/parse-exercise';

/** Questions that aren't levels, and readings that aren't off a trace: two carriers and a spread one beside them. */
const WRITTEN = {
	slug: 'two-carriers',
	title: 'Two carriers',
	client: 'Northmoor Telemetry',
	situation: 'Two carriers, and a telemetry signal above them.',
	plane: 'the receiver’s input',
	chain: [
		{ part: 'plane', label: 'answer for this plane' },
		{ part: 'box', label: 'Receiver' }
	],
	leads: [],
	cautions: ['Greatest input +27 dBm. Check for DC first.'],
	receiver: 'field',
	parameters: {
		lowHz: { draw: 'step', from: 449.99e6, to: 450.01e6, step: 1 },
		apartHz: { draw: 'step', from: 20e3, to: 40e3, step: 1 },
		lowDbm: { draw: 'uniform', from: -40, to: -30 },
		lessDb: { draw: 'uniform', from: 4, to: 12 },
		spread: { draw: 'choice', of: ['wide', 'narrow'] }
	},
	derived: { highHz: '=lowHz + apartHz' },
	shown: [],
	scene: {
		emitters: [
			{ kind: 'cw', frequencyHz: '=lowHz', levelDbm: '=lowDbm' },
			{ kind: 'cw', frequencyHz: '=highHz', levelDbm: '=lowDbm - lessDb' },
			...[9600, 10800].map((symbolRateHz, i) => ({
				kind: 'digital',
				when: { spread: ['narrow', 'wide'][i] },
				frequencyHz: 450.2e6,
				levelDbm: -25,
				symbolRateHz,
				rollOff: 0.3,
				order: 4
			}))
		]
	},
	start: { centreHz: 450.1e6, spanHz: 400e3, rbwHz: 1000 },
	questions: [
		{
			id: 'apart',
			text: 'How far apart are the carriers?',
			quantity: { kind: 'delta', fromHz: '=lowHz', toHz: '=highHz' },
			part: 'frequencyHz',
			unit: 'Hz',
			tolerance: { absolute: 600 },
			digits: 0,
			mistakes: [{ kind: 'lead-left-out' }]
		},
		{
			id: 'where',
			text: 'Where does the lower one stand?',
			quantity: { kind: 'count', atHz: '=lowHz' },
			unit: 'Hz',
			tolerance: { absolute: 500 },
			digits: 0,
			mistakes: [{ kind: 'lead-left-out' }]
		},
		{
			id: 'beside',
			text: 'What of the spread one falls 25 kHz above it?',
			quantity: {
				kind: 'adjacent-channel',
				centreHz: 450.2e6,
				widthHz: 16e3,
				offsets: [{ offsetHz: 25e3, widthHz: 16e3 }]
			},
			part: { offsetHz: 25e3, side: 'lower' },
			unit: 'dBc',
			// The receiver's own noise fills the channel: this question is for what may support an answer.
			tolerance: { absolute: 200 },
			digits: 1,
			mistakes: [{ kind: 'lead-left-out' }]
		},
		{
			id: 'occupied',
			text: 'How wide is it?',
			quantity: { kind: 'occupied-bandwidth', centreHz: 450.2e6, widthHz: 40e3, percent: 99 },
			unit: 'Hz',
			tolerance: { relative: 0.05 },
			digits: 0,
			mistakes: [{ kind: 'lead-left-out' }]
		}
	],
	hints: [],
	method: [
		{
			do: 'set',
			settings: { rbwHz: 300, detector: 'average', scale: 'power', traces: [{ mode: 'average', count: 8 }] }
		},
		{ do: 'sweep', sweeps: 8 },
		{
			do: 'read',
			reading: { kind: 'delta', fromHz: '=lowHz', toHz: '=highHz' },
			part: 'frequencyHz',
			as: 'betweenHz'
		},
		{ do: 'answer', question: 'apart', value: '=betweenHz', reading: 'betweenHz' },
		{
			do: 'read',
			reading: {
				kind: 'adjacent-channel',
				centreHz: 450.2e6,
				widthHz: 16e3,
				offsets: [{ offsetHz: 25e3, widthHz: 16e3 }]
			},
			part: { offsetHz: 25e3, side: 'lower' },
			as: 'besideDbc'
		},
		{ do: 'answer', question: 'beside', value: '=besideDbc', reading: 'besideDbc' },
		{
			do: 'read',
			reading: { kind: 'occupied-bandwidth', centreHz: 450.2e6, widthHz: 40e3, percent: 99 },
			as: 'wideHz'
		},
		{ do: 'answer', question: 'occupied', value: '=wideHz', reading: 'wideHz' },
		{ do: 'read', reading: { kind: 'count', atHz: '=lowHz', gateS: 0.1 }, as: 'countedHz' },
		{ do: 'answer', question: 'where', value: '=countedHz', reading: 'countedHz' }
	],
	benchTimeS: 600,
	tries: 3
};

export const twoCarriers: Exercise = parseExercise(WRITTEN);
