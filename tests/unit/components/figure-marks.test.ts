import { describe, expect, it } from 'vitest';
import { choiceShown, stateWords } from '$lib/components/figure/choice-words';
import { figureMarks } from '$lib/components/figure/figure-marks';
import { afterLesson } from '$lib/components/lesson/after-lesson';
import type { ExerciseProgress } from '$lib/schemas/course-view';

const taken = (kind: string, value: number, unit: string, parts?: unknown) => ({
	...{ kind, value, unit, spread: 0.1, remarks: [], parts }
});

describe('figureMarks(requests, outcomes)', () => {
	it('letters markers in their order and puts their flags on the trace', () =>
		expect(
			figureMarks(
				[{ kind: 'peak' }, { kind: 'marker', atHz: 450e6 }],
				[taken('peak', -20, 'dBm', { frequencyHz: 451e6 }), taken('marker', -60, 'dBm')]
			)
		).toEqual({
			names: ['A, highest point', 'Marker B, 450\u00a0MHz'],
			flags: [
				{ letter: 'A', at: 451e6, levelDbm: -20 },
				{ letter: 'B', at: 450e6, levelDbm: -60 }
			],
			bands: []
		}));

	it('gives a difference two flags, at the levels it is between', () =>
		expect(
			figureMarks(
				[{ kind: 'delta', fromHz: 1e6, toHz: 2e6 }],
				[taken('delta', -30, 'dB', { fromDbm: -10, toDbm: -40 })]
			)
		).toMatchObject({
			names: ['B less A'],
			flags: [
				{ letter: 'A', at: 1e6, levelDbm: -10 },
				{ letter: 'B', at: 2e6, levelDbm: -40 }
			]
		}));

	it('brackets a channel where it was asked, and an occupied bandwidth where it was found', () => {
		const { bands } = figureMarks(
			[
				{ kind: 'channel-power', centreHz: 450e6, widthHz: 20e3 },
				{ kind: 'occupied-bandwidth', percent: 99 }
			],
			[
				taken('channel-power', -19.84, 'dBm'),
				taken('occupied-bandwidth', 16e3, 'Hz', { lowerHz: 1e6, upperHz: 1.016e6 })
			]
		);
		expect(bands).toMatchObject([
			{ start: 449.99e6, stop: 450.01e6, figure: '−19.8', unit: 'dBm', what: 'Channel power, 20\u00a0kHz' },
			{ start: 1e6, stop: 1.016e6, figure: '16.000', unit: 'kHz' }
		]);
	});

	it('brackets each neighbouring channel with its own ratio', () =>
		expect(
			figureMarks(
				[
					{
						kind: 'adjacent-channel',
						centreHz: 450e6,
						widthHz: 16e3,
						offsets: [{ offsetHz: 25e3, widthHz: 16e3 }]
					}
				],
				[
					taken('adjacent-channel', -50, 'dBc', [
						{ offsetHz: 25e3, side: 'lower', levelDbm: -70, dbc: -50 },
						{ offsetHz: 25e3, side: 'upper', levelDbm: -75, dbc: -55 }
					])
				]
			).bands
		).toMatchObject([
			{ start: 449.967e6, stop: 449.983e6, figure: '−50.0', unit: 'dBc' },
			{ start: 450.017e6, stop: 450.033e6, figure: '−55.0' }
		]));

	it('tells readings of one kind and width apart by window and place', () => {
		const share = { kind: 'occupied-bandwidth', percent: 99 } as const;
		const channel = { kind: 'channel-power', widthHz: 25e3 } as const;
		const names = (...requests: Parameters<typeof figureMarks>[0]) =>
			figureMarks(requests, []).names.map((name) => name.replaceAll('\u00a0', ' '));
		const [all, window] = names(share, { ...share, centreHz: 450e6, widthHz: 25e3 });
		expect(all).toMatch(/ of all shown$/);
		expect(window).toMatch(/ within 25 kHz$/);
		expect(names({ ...channel, centreHz: 450e6 }, { ...channel, centreHz: 451e6 })).toEqual([
			'Channel power, 25 kHz at 450 MHz',
			'Channel power, 25 kHz at 451 MHz'
		]);
	});

	it('names what gave no number and draws nothing of it', () =>
		expect(figureMarks([{ kind: 'peak' }, { kind: 'marker', atHz: 1e6 }], [])).toEqual({
			names: ['A, highest point', 'Marker B, 1\u00a0MHz'],
			flags: [],
			bands: []
		}));
});

describe('choiceShown(setting, choice)', () => {
	it.each([
		['rbwHz', 3000, '3 kHz'],
		['sweepTimeS', 0.02, '20 ms'],
		['referenceDbm', -20, '−20 dBm'],
		['padDb', 10, '10 dB'],
		['points', 401, '401'],
		['vbwHz', 'auto', 'auto'],
		['detector', 'positive-peak', 'positive peak'],
		['scale', 'log', 'decibels'],
		['traceMode', 'max-hold', 'hold maximum'],
		['preamp', true, 'on'],
		['dcBlock', false, 'none'],
		['connected', false, 'matched load']
	] as const)('%s %s is %s', (setting, choice, words) => {
		const { figure, unit } = choiceShown(setting, choice);
		expect(unit ? `${figure} ${unit}` : figure).toBe(words);
	});

	it('joins what several controls stand at', () =>
		expect(
			stateWords(
				[
					{ setting: 'rbwHz', label: 'Resolution', choices: [300, 1000] },
					{ setting: 'traceMode', label: 'Trace', choices: ['live', 'average'] }
				],
				[300, 'average']
			)
		).toBe('300\u00a0Hz, average'));
});

describe('afterLesson(exercises)', () => {
	const exercise = (over: Partial<ExerciseProgress>): ExerciseProgress => ({
		...{ slug: 'a', title: 'A', number: 1, tries: 3, triesLeft: 3, attempts: [] },
		...{ standing: 'not-started', openAttemptId: null, repeat: null, ...over }
	});

	it('goes on with what is open before anything new', () =>
		expect(afterLesson([exercise({}), exercise({ slug: 'b', openAttemptId: 7 })])).toMatchObject({
			kind: 'go-on',
			attemptId: 7
		}));
	it('takes the first exercise that is not right and can still be tried', () =>
		expect(
			afterLesson([
				exercise({ standing: 'passed' }),
				exercise({ slug: 'b', standing: 'not-passed', triesLeft: 0 }),
				exercise({ slug: 'c', standing: 'not-passed', triesLeft: 1 })
			])
		).toMatchObject({ kind: 'exercise', exercise: { slug: 'c' } }));
	it('is done when there is none', () =>
		expect(afterLesson([exercise({ standing: 'passed' })]).kind).toBe('done'));
});
