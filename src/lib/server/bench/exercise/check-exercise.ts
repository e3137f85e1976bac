import type { Exercise } from '$lib/schemas/exercise';
import type { ExerciseQuestion } from '$lib/schemas/questions/question';
import { checkAnswer, checkQuestion } from '../grading/questions/registry';
import { profileNamed } from '../receiver/profiles';
import { BenchError } from '../bench-error';
import { refusalsOf, type ExerciseIssue } from './exercise-error';
import { parseExpression } from './expression';
import { DISPLAYED_PER_HZ } from './displayed-per-hz';
import { SWEPT_RBW_HZ } from './swept-rbw';
import { eachExpression } from './fill-template';
import { namesInText } from './fill-text';

const LEAST_PARAMETERS = 4;

/** What no schema can say: names that exist, answers that are given, texts that tell nothing hidden. */
export function checkExercise(exercise: Exercise): ExerciseIssue[] {
	return [
		...checkParameters(exercise),
		...checkNames(exercise),
		...checkTexts(exercise),
		...checkWhen(exercise),
		...checkMethod(exercise),
		...checkQuestions(exercise),
		...checkTrial(exercise)
	];
}

function checkParameters({ parameters, scene, derived }: Exercise): ExerciseIssue[] {
	const issues: ExerciseIssue[] = [];
	const count = Object.keys(parameters).length;
	if (count < LEAST_PARAMETERS) {
		issues.push({ field: 'parameters', message: `at least ${LEAST_PARAMETERS} are drawn; given ${count}` });
	}
	if (!scene.emitters.some((emitter) => 'when' in emitter)) {
		const message = 'what is there must be drawn too: give an emitter (the signal or a neighbour) a when';
		issues.push({ field: 'scene.emitters', message });
	}
	for (const name of Object.keys(derived)) {
		if (name in parameters) issues.push({ field: `derived.${name}`, message: 'is a parameter already' });
	}
	return issues;
}

/** Every expression reads, and uses only names that have a value where it stands. */
function checkNames(exercise: Exercise): ExerciseIssue[] {
	const issues: ExerciseIssue[] = [];
	const known = new Set(Object.keys(exercise.parameters));
	const check = (
		template: unknown,
		field: string,
		names: ReadonlySet<string>,
		why = 'nothing has this name here'
	) => {
		eachExpression(template, field, (text, place) => {
			issues.push(
				...refusalsOf(() => {
					const stranger = parseExpression(text, place).names.find((name) => !names.has(name));
					if (stranger) throw new BenchError(place, `${stranger}: ${why}`);
				})
			);
		});
	};
	for (const [name, value] of Object.entries(exercise.derived)) {
		check(value, `derived.${name}`, known);
		known.add(name);
	}
	const shown = new Set(exercise.shown);
	check(exercise.scene, 'scene', known);
	check(exercise.start, 'start', shown, 'the learner sees this: list it in shown');
	check(exercise.leads, 'leads', shown, 'the learner sees this: list it in shown');
	check(exercise.mask, 'mask', shown, 'the learner sees this: list it in shown');
	check(exercise.trial, 'trial', shown, 'the visitor sees this: list it in shown');
	exercise.questions.forEach((question, i) => {
		const truths = 'truths' in question ? Object.keys(question.truths) : [];
		check(question, `questions[${i}]`, new Set([...known, ...truths]));
	});
	known.add(DISPLAYED_PER_HZ);
	exercise.method.forEach((step, i) => {
		check(step, `method[${i}]`, step.do === 'answer' ? new Set([...known, SWEPT_RBW_HZ]) : known);
		if (step.do === 'read') known.add(step.as);
	});
	const drawn = new Set([...Object.keys(exercise.parameters), ...Object.keys(exercise.derived)]);
	exercise.shown.forEach((name, i) => {
		if (!drawn.has(name))
			issues.push({ field: `shown[${i}]`, message: `${name} is neither drawn nor derived` });
	});
	return issues;
}

/** What of a question the learner reads while the attempt is open. */
function textsOf(question: ExerciseQuestion, field: string): [string, string][] {
	const options =
		question.type === 'choice' ? question.options : question.type === 'order' ? question.items : [];
	const list = question.type === 'order' ? 'items' : 'options';
	return [
		[`${field}.text`, question.text],
		...options.map(({ text }, i): [string, string] => [`${field}.${list}[${i}].text`, text])
	];
}

/** Texts may tell what is shown, and nothing else of the draw. */
function checkTexts(exercise: Exercise): ExerciseIssue[] {
	const texts: [string, string | undefined][] = [
		['situation', exercise.situation],
		['plane', exercise.plane],
		...exercise.chain.flatMap((part, i): [string, string | undefined][] => [
			[`chain[${i}].label`, part.label],
			[`chain[${i}].branch`, 'branch' in part ? part.branch : undefined]
		]),
		...exercise.leads.map(({ label }, i): [string, string] => [`leads[${i}].label`, label]),
		...exercise.cautions.map((text, i): [string, string] => [`cautions[${i}]`, text]),
		...exercise.hints.map((text, i): [string, string] => [`hints[${i}]`, text]),
		...exercise.questions.flatMap((question, i) => textsOf(question, `questions[${i}]`))
	];
	return texts.flatMap(([field, text]) =>
		refusalsOf(() => {
			const stranger = namesInText(text ?? '', field).find((name) => !exercise.shown.includes(name));
			if (stranger) throw new BenchError(field, `${stranger} is not listed in shown, so no text may tell it`);
		})
	);
}

function checkWhen({ scene, parameters }: Exercise): ExerciseIssue[] {
	return scene.emitters.flatMap((emitter, i) =>
		Object.entries((emitter as { when?: Record<string, unknown> }).when ?? {}).flatMap(([name, wanted]) => {
			const field = `scene.emitters[${i}].when.${name}`;
			const draw = parameters[name];
			if (draw?.draw !== 'choice') return [{ field, message: 'names no parameter that is a choice' }];
			const never = [wanted].flat().filter((value) => !draw.of.includes(value as string | number));
			return never.map((value) => ({ field, message: `${String(value)} is never chosen` }));
		})
	);
}

function checkMethod({ method, questions }: Exercise): ExerciseIssue[] {
	const issues: ExerciseIssue[] = [];
	const taken = new Set<string>();
	method.forEach((step, i) => {
		if (step.do === 'read') {
			if (taken.has(step.as))
				issues.push({ field: `method[${i}].as`, message: `${step.as} was read before` });
			taken.add(step.as);
		}
		if (step.do !== 'answer') return;
		const asked = questions.find(({ id }) => id === step.question);
		if (asked) issues.push(...checkAnswer(asked, step, `method[${i}]`));
		else issues.push({ field: `method[${i}].question`, message: `no question is called ${step.question}` });
		if (step.reading !== undefined && !taken.has(step.reading)) {
			issues.push({ field: `method[${i}].reading`, message: `nothing was read as ${step.reading} before` });
		}
	});
	for (const { id } of questions) {
		const answers = method.filter((step) => step.do === 'answer' && step.question === id).length;
		if (answers !== 1)
			issues.push({ field: 'method', message: `must answer ${id} once; it does ${answers} times` });
	}
	return issues;
}

/** What anyone may try on the front page: a question that is asked, through filters that the receiver has. */
function checkTrial({ trial, questions, receiver }: Exercise): ExerciseIssue[] {
	if (!trial) return [];
	const issues: ExerciseIssue[] = [];
	const asked = questions.find(({ id }) => id === trial.question);
	if (asked?.type !== 'number') {
		const message = asked ? 'only a number is asked of visitors' : `no question is called ${trial.question}`;
		issues.push({ field: 'trial.question', message });
	}
	const { rbwHz } = typeof receiver === 'string' ? profileNamed(receiver) : receiver;
	trial.resolutionsHz.forEach((hz, i) => {
		const field = `trial.resolutionsHz[${i}]`;
		if (!rbwHz.includes(hz)) issues.push({ field, message: `the receiver has no filter of ${hz} Hz` });
		if (trial.resolutionsHz.indexOf(hz) !== i) issues.push({ field, message: 'is offered twice' });
	});
	return issues;
}

function checkQuestions(exercise: Exercise): ExerciseIssue[] {
	const { questions } = exercise;
	return questions.flatMap((question, i) => {
		const field = `questions[${i}]`;
		const issues = checkQuestion(question, field, exercise);
		if (questions.findIndex(({ id }) => id === question.id) !== i) {
			issues.push({ field: `${field}.id`, message: `${question.id} is asked twice` });
		}
		return issues;
	});
}
