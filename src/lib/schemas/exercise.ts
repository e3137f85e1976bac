/**
 * An exercise as its author writes it (YAML under content/): what is drawn per seed, the scene made of it, the brief,
 * the questions, the taught method as data, and the mistakes watched. Unknown keys are refused by name.
 * Texts may hold {name} or {expression | digits}, over the values listed in `shown` and nothing else.
 */
import { z } from 'zod';
import { part } from './part';
import { exerciseQuestion } from './questions/question';
import { line, slug, text, truthful, valueName, when } from './questions/words';
import { benchRequest, maskLimits } from './reading';
import { receiverProfile } from './receiver';
import { device, emitter, lossTable } from './scene';
import { settings } from './settings';
import { expression, numberOrExpression, templateObject, templateOf } from './template';

/** How a parameter is drawn from the attempt's seed. `step` draws from … to inclusive on a grid. */
export const parameterDraw = z.discriminatedUnion('draw', [
	z
		.strictObject({ draw: z.literal('uniform'), from: z.number(), to: z.number() })
		.refine((p) => p.to > p.from, { message: 'to must be greater than from', path: ['to'] }),
	z
		.strictObject({ draw: z.literal('integer'), from: z.int(), to: z.int() })
		.refine((p) => p.to > p.from, { message: 'to must be greater than from', path: ['to'] }),
	z
		.strictObject({ draw: z.literal('step'), from: z.number(), to: z.number(), step: z.number().positive() })
		.refine((p) => p.to > p.from, { message: 'to must be greater than from', path: ['to'] }),
	z.strictObject({
		draw: z.literal('choice'),
		of: z
			.array(z.union([z.number(), z.string().min(1).max(40)]))
			.min(2)
			.max(50)
	})
]);

const emitterTemplates = emitter.options.map((option) =>
	templateObject(option as z.ZodObject).extend({ when: when.optional() })
);
export const sceneTemplate = z.strictObject({
	emitters: z
		.array(z.discriminatedUnion('kind', emitterTemplates as unknown as [z.ZodObject, ...z.ZodObject[]]))
		.min(1)
		.max(200),
	device: templateOf(device).optional(),
	path: templateOf(lossTable).optional()
});
export const settingsTemplate = templateOf(settings);

const partTemplate = templateOf(part);
const readingTemplate = templateOf(benchRequest);

/** The sketch of what is connected, from source to receiver; `plane` marks where the answers hold. */
export const chainPart = z.discriminatedUnion('part', [
	z.strictObject({ part: z.literal('box'), label: line, branch: line.optional() }),
	z.strictObject({ part: z.literal('lead'), label: line }),
	z.strictObject({ part: z.literal('pad'), label: line }),
	z.strictObject({ part: z.literal('plane'), label: line })
]);

const why = line.optional();
/** The taught method, step by step; settings are changes to what was set before. */
export const methodStep = z.discriminatedUnion('do', [
	z.strictObject({ do: z.literal('set'), settings: settingsTemplate, why }),
	z.strictObject({ do: z.literal('sweep'), sweeps: z.int().min(1).max(1000), why }),
	z.strictObject({
		do: z.literal('read'),
		reading: readingTemplate,
		/** What of the reading the name stands for; absent: its value. */
		part: partTemplate.optional(),
		trace: z.int().min(1).max(4).default(1),
		as: valueName,
		why
	}),
	z.strictObject({
		do: z.literal('answer'),
		question: slug,
		/** A number: its value, and the reading handed in as evidence, by the name given to it. */
		value: expression.optional(),
		reading: valueName.optional(),
		/** A choice: whether each option is chosen, as the readings say; one left out isn't. A set-up needs nothing. */
		chosen: z.record(slug, truthful).optional(),
		/** A mark: where it stands on the screen; of a band, both edges. */
		atHz: expression.optional(),
		toHz: expression.optional(),
		/** An order: by what each item is ordered, as the readings say. */
		by: z.record(slug, expression).optional(),
		/** A table of emissions, row by row. */
		rows: z
			.array(
				z.strictObject({
					when: when.optional(),
					atHz: expression,
					levelDbm: expression,
					breaks: truthful.optional()
				})
			)
			.min(1)
			.max(24)
			.optional(),
		/** An uncertainty: beside value and reading, the expanded uncertainty in dB and its coverage factor. */
		expandedDb: expression.optional(),
		k: z.number().min(1).max(4).optional(),
		why
	})
]);

/** Lets anyone try one of the exercise's questions on the front page, turning nothing but the resolution. */
const trial = z.strictObject({
	question: slug,
	/** The question in one short sentence: "How far apart are these two carriers?" */
	text: line,
	/** Offered from wide to narrow; the first is the one it starts with. */
	resolutionsHz: z.array(z.number().positive()).min(2).max(8),
	/** What else is set. */
	settings: settingsTemplate
});

export const exercise = z.strictObject({
	slug,
	title: line,
	client: line,
	situation: text,
	/** Where the answers hold, in words: "the coupler's port". */
	plane: line,
	chain: z.array(chainPart).min(2).max(8),
	/** Loss shown to the learner for each lead or pad in the chain. */
	leads: z.array(z.strictObject({ label: line, loss: templateOf(lossTable) })).max(4),
	cautions: z.array(line).min(1).max(6),
	/** Limits that the order sets, as levels on the screen: drawn as a ceiling, and offered as a reading. */
	mask: z.strictObject({ limits: templateOf(maskLimits) }).optional(),
	receiver: z.union([z.enum(['field', 'modest']), receiverProfile]),
	parameters: z.record(valueName, parameterDraw),
	/** Values computed from the parameters, in order. */
	derived: z.record(valueName, numberOrExpression).default({}),
	/** Parameters and derived values that the learner is told; only these may stand in texts. */
	shown: z.array(valueName).max(40),
	scene: sceneTemplate,
	start: settingsTemplate,
	questions: z.array(exerciseQuestion).min(1).max(6),
	hints: z.array(line).max(6),
	method: z.array(methodStep).min(3).max(60),
	/** Receiver time an attempt may use, s. */
	benchTimeS: z.number().positive().max(86_400),
	tries: z.int().min(1).max(20),
	trial: trial.optional()
});

export type ParameterDraw = z.infer<typeof parameterDraw>;
export type ChainPart = z.infer<typeof chainPart>;
export type MethodStep = z.infer<typeof methodStep>;
export type Exercise = z.infer<typeof exercise>;
