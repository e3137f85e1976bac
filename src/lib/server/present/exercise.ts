import type { ChainPart } from '$lib/schemas/exercise';
import type { ExerciseQuestion } from '$lib/schemas/questions/question';
import type { ExerciseView, ReceiverView } from '$lib/schemas/exercise-view';
import { presentQuestion, type AskedQuestion } from './question';
import type { MaskLimits } from '$lib/schemas/reading';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { LossTable } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';

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
	questions: AskedQuestion[];
	written: ExerciseQuestion[];
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
		questions: parts.questions.map((asked, i) => presentQuestion(asked, parts.written[i])),
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
