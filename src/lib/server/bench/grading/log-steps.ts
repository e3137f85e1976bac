import type { FindingLogStep } from '$lib/schemas/finding';
import type { AttemptRecord } from '../exercise/attempt-record';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { quantityText } from '../exercise/quantity-text';
import { describeReading } from './describe-reading';
import { describeSettings, SAME } from './describe-settings';
import type { Judgement } from './judge-question';
import type { ExplainedQuestion } from './question-finding';
import { shownDigits } from './spreads';

interface Blame {
	entry?: number;
	reading?: string;
	question?: string;
	text: string;
}

/** Which step of the log each mistake belongs to. A set-up or reading nobody recorded leaves the answer to blame. */
function blamesOf({ evidence, matched }: Judgement, { accounts }: ExplainedQuestion): Blame[] {
	const question = evidence.question.id;
	const source = matched?.source;
	return accounts.flatMap(({ explanation }): Blame[] => {
		if (!explanation) return [];
		const { at, text } = explanation.bad;
		if (at === 'set-up' && source) return [{ entry: source.entry, text }];
		if (at === 'reading' && source) return [{ reading: source.id, text }];
		return [{ question, text }];
	});
}

/** What was done, in order, with what was wrong at the step where it was done. */
export function logSteps(
	drawn: DrawnExercise,
	record: AttemptRecord,
	judged: readonly { judgement: Judgement; explained: ExplainedQuestion }[]
): FindingLogStep[] {
	const blames = judged.flatMap(({ judgement, explained }) => blamesOf(judgement, explained));
	const badAt = (is: (blame: Blame) => boolean) => {
		const texts = new Set(blames.filter(is).map(({ text }) => text));
		return texts.size > 0 ? { bad: [...texts].join('; ').replaceAll('; Here: ', '; ') } : {};
	};
	const setUps = record.log.flatMap((entry, i) => {
		const next = record.log[i + 1]?.firstRow ?? Infinity;
		const readings = record.readings.filter(({ rows }) => rows.to >= entry.firstRow && rows.to < next);
		const text = describeSettings(record.log[i - 1]?.settings, entry.settings);
		const step = {
			...wallTime(entry.at),
			clockS: entry.clockS,
			text,
			...badAt((blame) => blame.entry === i)
		};
		// A count with the set-up that stands is no step of its own.
		const onlyCounted = entry.sweeps === 0 && i > 0 && text === SAME;
		return [
			...(onlyCounted && !('bad' in step) ? [] : [step]),
			...readings.map((taken) => ({
				...wallTime(taken.at),
				clockS: entry.clockS,
				text: `Reading: ${describeReading(taken.request)}, ${quantityText(taken.reading.value, taken.reading.unit)}`,
				...badAt((blame) => blame.reading === taken.id)
			}))
		];
	});
	const clockS = setUps.at(-1)?.clockS ?? 0;
	const answers = drawn.questions.flatMap((question, i) => {
		const answer = record.answers[question.id];
		if (!answer) return [];
		const taken = record.readings.find(({ id }) => id === answer.readingId);
		const from = taken ? `, from ${describeReading(taken.request)}` : ', no reading attached';
		const text = `Answer ${i + 1}: ${quantityText(answer.value, question.unit, shownDigits(question))}${from}`;
		return [{ clockS, text, ...badAt((blame) => blame.question === question.id) }];
	});
	return [...setUps, ...answers];
}

const wallTime = (at: string | undefined) => (at === undefined ? {} : { at });
