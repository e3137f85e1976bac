import { describe, expect, it } from 'vitest';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { firstExercise, firstExerciseText, issuesAfter } from '../../factories/first-exercise';

const fields = (change: Parameters<typeof issuesAfter>[0]) => issuesAfter(change).map(({ field }) => field);

describe('parseExercise(data)', () => {
	it('takes the first exercise: four drawn parameters at least, six mistakes watched at least', () => {
		expect(Object.keys(firstExercise.parameters).length).toBeGreaterThanOrEqual(4);
		const kinds = firstExercise.questions.flatMap((question) =>
			question.type === 'number' ? question.mistakes.map(({ kind }) => kind) : []
		);
		expect(new Set(kinds).size).toBeGreaterThanOrEqual(6);
	});

	it.each<[string, (draft: never) => void, string]>([
		['an unknown key', (d: { colour: string }) => void (d.colour = 'red'), 'colour'],
		[
			'an unknown key of an emitter',
			(d: never) => set(d, 'scene.emitters.0.power', 1),
			'scene.emitters[0].power'
		],
		['an unknown key of a setting', (d: never) => set(d, 'start.colour', 1), 'start.colour'],
		['an unknown key of a method step', (d: never) => set(d, 'method.0.speed', 1), 'method[0].speed'],
		['an unknown key of a reading', (d: never) => set(d, 'method.4.reading.hz', 1), 'method[4].reading.hz'],
		[
			'an unknown key of a quantity',
			(d: never) => set(d, 'questions.0.quantity.hz', 1),
			'questions[0].quantity.hz'
		],
		[
			'an unknown parameter of a mistake',
			(d: never) => set(d, 'questions.0.mistakes.0.by', 1),
			'questions[0].mistakes[0].by'
		],
		[
			'a missing parameter of a mistake',
			(d: never) => set(d, 'questions.0.mistakes.3', { kind: 'wrong-width' }),
			'questions[0].mistakes[3].widthHz'
		],
		[
			'a mistake nobody knows',
			(d: never) => set(d, 'questions.0.mistakes.0.kind', 'haste'),
			'questions[0].mistakes[0].kind'
		],
		[
			'a mistake watched twice',
			(d: never) => set(d, 'questions.0.mistakes.1', { kind: 'marker-as-power' }),
			'questions[0].mistakes[1]'
		],
		[
			'a draw that runs backwards',
			(d: never) => set(d, 'parameters.carrierOffsetHz.to', -900),
			'parameters.carrierOffsetHz.to'
		],
		[
			'a filter swept with where nothing was read yet',
			(d: never) => set(d, 'method.0.settings.spanHz', '=sweptRbwHz'),
			'method[0].settings.spanHz'
		],
		[
			'an expression that is none',
			(d: never) => set(d, 'scene.emitters.0.levelDbm', 'high'),
			'scene.emitters[0].levelDbm'
		],
		[
			'an expression over an unknown name',
			(d: never) => set(d, 'scene.emitters.0.levelDbm', '=power'),
			'scene.emitters[0].levelDbm'
		],
		[
			'an expression that calls something',
			(d: never) => set(d, 'scene.emitters.0.levelDbm', '=cos(1)'),
			'scene.emitters[0].levelDbm'
		],
		[
			'a derived name used before it is there',
			(d: never) => set(d, 'derived.channelWidthHz', '=neighbourHz'),
			'derived.channelWidthHz'
		],
		[
			'a value out of range once filled in',
			(d: never) => set(d, 'scene.emitters.0.rollOff', '=rollOff*10'),
			'scene.emitters[0].rollOff'
		],
		[
			'a when over nothing chosen',
			(d: never) => set(d, 'scene.emitters.1.when', { channel: 3 }),
			'scene.emitters[1].when.channel'
		],
		[
			'a when that never holds',
			(d: never) => set(d, 'scene.emitters.1.when', { neighbour: 'radar' }),
			'scene.emitters[1].when.neighbour'
		],
		[
			'a text that tells a hidden value',
			(d: never) => set(d, 'situation', 'It sends {carrierDbm} dBm.'),
			'situation'
		],
		[
			'a hint that tells a hidden value',
			(d: never) => set(d, 'hints.0', 'Try {carrierDbm + leadLossDb}.'),
			'hints[0]'
		],
		[
			'start settings that tell a hidden value',
			(d: never) => set(d, 'start.referenceDbm', '=carrierDbm'),
			'start.referenceDbm'
		],
		[
			'a lead shown with a hidden value',
			(d: never) => set(d, 'leads.0.loss.0.lossDb', '=carrierDbm'),
			'leads[0].loss[0].lossDb'
		],
		[
			'limits shown with a hidden value',
			(d: never) => set(d, 'mask', { limits: [{ startHz: 449e6, stopHz: 451e6, levelDbm: '=carrierDbm' }] }),
			'mask.limits[0].levelDbm'
		],
		['a name shown that is not drawn', (d: never) => set(d, 'shown.0', 'nothing'), 'shown[0]'],
		[
			'a unit that the quantity is not in',
			(d: never) => set(d, 'questions.0.unit', 'Hz'),
			'questions[0].unit'
		],
		[
			'a tolerance of neither sort',
			(d: never) => set(d, 'questions.0.tolerance', {}),
			'questions[0].tolerance'
		],
		[
			'a tolerance under the receiver’s level error',
			(d: never) => set(d, 'questions.0.tolerance.absolute', 0.6),
			'questions[0].tolerance.absolute'
		],
		['a receiver nobody knows', (d: never) => set(d, 'receiver', 'grand'), 'receiver'],
		[
			'a method answering no question',
			(d: never) => set(d, 'method.5.question', 'colour'),
			'method[5].question'
		],
		[
			'a method resting on nothing read',
			(d: never) => set(d, 'method.5.reading', 'nothing'),
			'method[5].reading'
		],
		['no caution', (d: never) => set(d, 'cautions', []), 'cautions'],
		['no tries', (d: never) => set(d, 'tries', 0), 'tries']
	])('refuses %s by name', (_, change, field) => expect(fields(change as never)).toContain(field));

	it('refuses fewer than four drawn parameters', () => {
		const change = (d: { parameters: object; derived: object; scene: { emitters: object[] } }) => {
			d.parameters = { leadLossDb: { draw: 'uniform', from: 3, to: 4 } };
		};
		expect(fields(change as never)).toContain('parameters');
	});

	it('refuses an exercise in which what is there never changes', () =>
		expect(
			fields((d: { scene: { emitters: { when?: object }[] } }) => {
				for (const emitter of d.scene.emitters) delete emitter.when;
			})
		).toContain('scene.emitters'));

	it.each([
		['of a question that isn’t asked', { question: 'loudness' }, 'trial.question'],
		[
			'through a filter that the receiver hasn’t got',
			{ resolutionsHz: [300, 500] },
			'trial.resolutionsHz[1]'
		],
		[
			'that tells what the learner isn’t told',
			{ settings: { centreHz: '=carrierDbm' } },
			'trial.settings.centreHz'
		]
	])('refuses a trial %s', (_, over, field) => {
		const trial = {
			question: 'channel-power',
			text: 'How much?',
			resolutionsHz: [300, 1000],
			settings: {},
			...over
		};
		expect(fields((draft: { trial?: object }) => void (draft.trial = trial))).toEqual([field]);
	});

	it('refuses a question that the method leaves out', () =>
		expect(fields((d: { method: object[] }) => void d.method.pop())).toContain('method'));
});

describe('parseExerciseText(text, file)', () => {
	it('names file, line and field', () => {
		const text = firstExerciseText.replace('rollOff: =rollOff', 'rollOff: =roundness');
		const line = text.slice(0, text.indexOf('=roundness')).split('\n').length;
		const refused = () => parseExerciseText(text, 'spread.yaml');
		expect(refused).toThrow(`spread.yaml:${line}: scene.emitters[0].rollOff: roundness`);
	});

	it('names the line of an unknown key', () => {
		const text = firstExerciseText.replace('benchTimeS: 1200', 'benchTimeS: 1200\ncolour: red');
		const line = text.slice(0, text.indexOf('colour: red')).split('\n').length;
		expect(() => parseExerciseText(text, 'spread.yaml')).toThrow(`spread.yaml:${line}: colour: unknown here`);
	});

	it('names the line where the file stops being YAML', () =>
		expect(() => parseExerciseText('slug: a\ntitle: [', 'broken.yaml')).toThrow(
			/^broken\.yaml:\d+: \(file\)/
		));
});

/** Puts `value` at a dotted path. */
function set(draft: unknown, path: string, value: unknown): void {
	const keys = path.split('.');
	let at = draft as Record<string, unknown>;
	for (const key of keys.slice(0, -1)) at = at[key] as Record<string, unknown>;
	at[keys[keys.length - 1]] = value;
}
