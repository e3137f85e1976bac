import type { ChainPart, ExerciseQuestion, Tolerance } from '$lib/schemas/exercise';
import type { ExerciseView, QuestionView, ReceiverView } from '$lib/schemas/exercise-view';
import type { MaskLimits } from '$lib/schemas/reading';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { LossTable } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { dimensionOf, dimensionSpec } from '$lib/units/dimension';
import { formatFigure, formatFrequency, formatTime } from '$lib/units/format-quantity';

/** What an exercise view is made of. The records hold more; only what stands here goes out. */
export interface ExerciseParts {
	course: { slug: string; title: string };
	unit: { slug: string; title: string; number: number };
	exercise: { slug: string; title: string; number: number; tries: number };
	client: string;
	benchTimeS: number;
	/** With this attempt's numbers in it. */
	situationHtml: string;
	brief: {
		plane: string;
		chain: ChainPart[];
		leads: { label: string; loss: LossTable }[];
		cautions: string[];
		mask?: { limits: MaskLimits };
		start: Settings;
	};
	profile: ReceiverProfile;
	/** As asked in this attempt, and as the author wrote them, in the same order. */
	questions: { id: string; text: string }[];
	written: Pick<ExerciseQuestion, 'unit' | 'digits' | 'tolerance'>[];
}

export function presentExercise(parts: ExerciseParts): ExerciseView {
	const { course, unit, exercise, brief } = parts;
	return {
		slug: exercise.slug,
		title: exercise.title,
		course: { slug: course.slug, title: course.title },
		unit: { slug: unit.slug, title: unit.title, number: unit.number },
		number: exercise.number,
		client: parts.client,
		situationHtml: parts.situationHtml,
		plane: brief.plane,
		chain: brief.chain,
		leads: brief.leads.map(({ label, loss }) => ({ label, loss })),
		cautions: brief.cautions,
		...(brief.mask && { mask: brief.mask }),
		receiver: presentReceiver(parts.profile),
		start: brief.start,
		questions: parts.questions.map(({ id, text }, i) => presentQuestion(id, text, parts.written[i])),
		benchTimeS: parts.benchTimeS,
		tries: exercise.tries
	};
}

/** What the receiver's data sheet says and the bench page needs to offer only what it has. */
export const presentReceiver = (profile: ReceiverProfile): ReceiverView => ({
	name: profile.name,
	startHz: profile.startHz,
	stopHz: profile.stopHz,
	rbwHz: profile.rbwHz,
	attenuatorDb: profile.attenuatorDb,
	preampGainDb: profile.preamp?.gainDb ?? null,
	maxSafeInputDbm: profile.maxSafeInputDbm,
	levelErrorDb: profile.levelErrorDb,
	referencePpm: profile.referencePpm
});

function presentQuestion(
	id: string,
	text: string,
	{ unit, digits, tolerance }: ExerciseParts['written'][number]
): QuestionView {
	return {
		id,
		text,
		unit,
		units: presentUnits(unit),
		digits,
		toleranceText: presentTolerance(tolerance, unit)
	};
}

/** Every unit that an answer asked for in `unit` may be given in, that one first. */
export function presentUnits(unit: string): string[] {
	const dimension = dimensionOf(unit);
	const others = dimension ? Object.keys(dimensionSpec(dimension).units) : [];
	return [unit, ...others.filter((other) => other !== unit)];
}

/** From what the author wrote: a share of the true value must not be worked out here, it would tell the value. */
export function presentTolerance(tolerance: Tolerance, unit: string): string {
	if ('relative' in tolerance) return `Right within ±${shortest(tolerance.relative * 100)} %`;
	const { absolute } = tolerance;
	if (unit === 'Hz') return `Right within ±${formatFrequency(absolute)}`;
	if (unit === 's') return `Right within ±${formatTime(absolute)}`;
	if (unit === '%') return `Right within ±${shortest(absolute)} percentage points`;
	return `Right within ±${shortest(absolute)}${unit === '1' ? '' : ' dB'}`;
}

const shortest = (value: number): string =>
	formatFigure(Number(value.toPrecision(6)), 6).replace(/\.?0+$/, '');
