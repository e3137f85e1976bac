import type { FindingLogStep } from '$lib/schemas/finding';
import type { AttemptRecord, GivenAnswer } from '../exercise/attempt-record';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { quantityText } from '../exercise/quantity-text';
import { describeReading } from './describe-reading';
import { describeSettings, SAME } from './describe-settings';
import type { Blame } from './questions/question-type';
import { answerWords } from './questions/registry';

/** What was done, in order, with what was wrong at the step where it was done. */
export function logSteps(
	drawn: DrawnExercise,
	record: AttemptRecord,
	blames: readonly Blame[]
): FindingLogStep[] {
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
		const text = `Answer ${i + 1}: ${answerWords(question, answer)}${restingOn(answer, record)}`;
		return [{ clockS, text, ...badAt((blame) => blame.question === question.id) }];
	});
	return [...setUps, ...answers];
}

const wallTime = (at: string | undefined) => (at === undefined ? {} : { at });

/** The reading that a number is said to rest on, in words. */
function restingOn(answer: GivenAnswer, { readings }: AttemptRecord): string {
	if (!('value' in answer)) return '';
	const taken = readings.find(({ id }) => id === answer.readingId);
	return taken ? `, from ${describeReading(taken.request)}` : ', no reading attached';
}
