import { describe, expect, it } from 'vitest';
import { stringify } from 'yaml';
import { ExerciseError } from '$lib/server/bench/exercise/exercise-error';
import { parseFigureText } from '$lib/server/bench/figure/parse-figure';
import { writtenFigure } from '../../factories/figure';

type Over = Parameters<typeof writtenFigure>[0];
const parse = (over: Over = {}) => parseFigureText(stringify(writtenFigure(over)));
const controls = (setting: string, choices: unknown[]): Over => ({
	controls: [{ setting, label: 'Turn', choices }]
});
const settings = (over: Record<string, unknown>): Over => ({
	settings: { ...(writtenFigure().settings as object), ...over }
});

/** The first fault as "line field: message". */
function faultOf(over: Over): string {
	try {
		parse(over);
	} catch (error) {
		if (!(error instanceof ExerciseError)) throw error;
		const [{ field, message, line }] = error.issues;
		return `${line} ${field}: ${message}`;
	}
	return 'none';
}

describe('parseFigureText(text)', () => {
	it('takes a figure as an author writes it, with defaults for what is left out', () => {
		expect(parse()).toMatchObject({ id: 'hump', sweeps: 2, rangeDb: 80 });
		expect(parse({ sweeps: undefined, readings: undefined })).toMatchObject({ sweeps: 1, readings: [] });
	});

	it('reads numbers as authors write them: 450.0125e6 and 25e3', () => {
		const text = stringify(writtenFigure()).replaceAll('450000000', '450.0125e6').replace('60000', '60e3');
		expect(parseFigureText(text).settings).toMatchObject({ centreHz: 450.0125e6, spanHz: 60e3 });
	});

	it.each([
		['padDb', [0, 10, 20]],
		['dcBlock', [false, true]],
		['connected', [true, false]],
		['traceMode', ['live', 'average', 'max-hold']],
		['preamp', [false, true]],
		['detector', ['average', 'positive-peak']],
		['attenuationDb', ['auto', 0, 10]],
		['vbwHz', ['auto', 100]],
		['referenceDbm', [0, -20]]
	])('lets a reader turn %s', (setting, choices) =>
		expect(parse(controls(setting, choices)).controls[0].choices).toEqual(choices)
	);

	it.each<[string, Over, RegExp]>([
		['a key that nobody knows', { colour: 'red' } as Over, /^\d+ colour: unknown here$/],
		['an emitter that is none', { scene: { emitters: [{ kind: 'lamp' }] } }, /scene\.emitters\[0\]\.kind/],
		['a setting that nothing turns', controls('traces', [1, 2]), /^\d+ controls\[0\]\.setting/],
		['one choice only', controls('rbwHz', [300]), /^\d+ controls\[0\]\.choices/],
		[
			'a choice given twice',
			controls('rbwHz', [300, 1000, 300]),
			/controls\[0\]\.choices: has a choice twice/
		],
		['a start that is no choice', controls('rbwHz', [100, 1000]), /controls\[0\]\.choices: must hold 300/],
		['settings that the receiver can’t do', settings({ preamp: true, centreHz: 9e9 }), /settings\.centreHz/],
		[
			'a preamplifier that isn’t there',
			{ receiver: 'modest', ...settings({ preamp: true }) },
			/settings\.preamp/
		],
		[
			'a choice that the receiver can’t do',
			controls('rbwHz', [300, 500, 1000]),
			/^\d+ controls\[0\]\.choices\[1\]: with rbwHz 500, rbwHz must be one of/
		],
		['a choice that is no such thing', controls('rbwHz', [300, 'wide']), /controls\[0\]\.choices\[1\]/],
		['a pad that does not exist', controls('padDb', [0, 15]), /controls\[0\]\.choices\[1\]/],
		[
			'two choices that don’t go together',
			{
				controls: [
					{ setting: 'rbwHz', label: 'Resolution', choices: [300, 30] },
					{ setting: 'spanHz', label: 'Span', choices: [60e3, 30e6] }
				]
			},
			/controls\[0\]\.choices\[1\]: with rbwHz 30 and spanHz 30000000, rbwHz .*needs a sweep of/
		],
		[
			'one setting turned twice',
			{ controls: [1, 2].map(() => writtenFigure().controls).flat(2) },
			/turns one/
		],
		['too many rows', { sweeps: 400, ...settings({ points: 10001 }) }, /sweeps: sweeps × points/],
		[
			'a reading without its width',
			{ readings: [{ kind: 'channel-power', centreHz: 1e6 }] },
			/readings\[0\]/
		],
		[
			'an emitter whose phase noise is no longer phase noise',
			{
				scene: {
					emitters: [
						{
							kind: 'cw',
							frequencyHz: 450e6,
							levelDbm: 0,
							phaseNoise: [{ offsetHz: 1e3, dbcPerHz: -20 }]
						}
					]
				}
			},
			/scene\.emitters/
		]
	])('refuses %s by field and line', (_, over, message) => expect(faultOf(over)).toMatch(message));

	it('says the line that the field stands on', () => {
		const text = 'id: a\ncaption: b\nreceiver: none\n';
		expect(() => parseFigureText(text)).toThrow(ExerciseError);
		try {
			parseFigureText(text);
		} catch (error) {
			expect((error as ExerciseError).issues[0]).toMatchObject({ field: 'receiver', line: 3 });
		}
	});

	it('says the line of what is no YAML', () => {
		try {
			parseFigureText('id: a\ncaption: [x\n');
			expect.unreachable();
		} catch (error) {
			expect((error as ExerciseError).issues[0].line).toBeGreaterThanOrEqual(2);
		}
	});
});
