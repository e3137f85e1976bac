import type { Verdict } from '$lib/schemas/questions/finding';
import type { AttemptRecord } from '../exercise/attempt-record';
import type { DrawnExercise, NumberQuestion } from '../exercise/drawn-exercise';
import { evidenceFor, type Evidence, type Source } from './evidence';
import { fromSource, type Candidate } from './explanations';
import { matchMistakes } from './match-mistakes';
import { betweenMarkers } from './between-markers';
import { copyingReach } from './spreads';
import { supports } from './supports';
import { watchedMistakes, type Watched } from './watched-mistakes';

export interface Remark {
	code: string;
	text: string;
}
export interface Judgement {
	evidence: Evidence;
	watched: Watched[];
	verdict: Verdict;
	/** yours − true; null when unanswered. */
	difference: number | null;
	/** For a wrong number: the mistakes that give it. For a right one: what its method can't support. */
	matched: Candidate | null;
	/** The reading that the answer was, or must have been, taken from. */
	source: Source | undefined;
	remarks: Remark[];
}

const gives = (source: Source, value: number, question: NumberQuestion): boolean =>
	[source.planeValue, source.cleanValue].some((given) => Math.abs(given - value) <= copyingReach(question));

/** Judges one question. Pure: the same record always gets the same judgement. */
export function judgeQuestion(
	drawn: DrawnExercise,
	question: NumberQuestion,
	record: AttemptRecord
): Judgement {
	const evidence = evidenceFor(drawn, question, record);
	const watched = watchedMistakes(question);
	const { answer, attached } = evidence;
	const base = { evidence, watched, matched: null, source: attached, remarks: readingRemarks(attached) };
	if (!answer) return { ...base, verdict: 'unanswered', difference: null };
	const difference = answer.value - question.truth;
	if (Math.abs(difference) > question.tolerance) {
		const matched = matchMistakes(watched, evidence);
		return { ...base, verdict: 'wrong', difference, matched, source: matched?.source ?? attached };
	}
	return { ...base, difference, ...judgeMethod(evidence, watched, answer.value) };
}

const readingRemarks = (source: Source | undefined): Remark[] =>
	(source?.reading.remarks ?? []).map(({ code, text }) => ({ code, text }));

/** A right number: can what was done on the bench support it? */
function judgeMethod(
	evidence: Evidence,
	watched: readonly Watched[],
	value: number
): Pick<Judgement, 'verdict' | 'matched' | 'source' | 'remarks'> {
	const { attached, pool, question } = evidence;
	const faults = (source: Source) => fromSource(source, watched, evidence);
	const sound = (source: Source) => supports(source, question) && faults(source).length === 0;
	const giving = pool.filter((source) => gives(source, value, question));
	const source = giving.find(sound) ?? attached ?? giving[0];
	const remarks = readingRemarks(source);
	if (!(source && gives(source, value, question)) && betweenMarkers(evidence, value)) {
		remarks.push({
			code: 'between-markers',
			text: 'Two markers of yours give this difference, and the sum is sound. But each was read on its own, perhaps from another sweep. Read one marker from the other, and both come from one trace, with the difference as one reading that others can repeat.'
		});
		return { verdict: 'right-but-method', matched: null, source, remarks };
	}
	if (!source) {
		remarks.push({
			code: 'no-evidence',
			text: 'No reading of yours gives this number: nobody could repeat it from your record.'
		});
		return { verdict: 'right-but-method', matched: null, source, remarks };
	}
	if (sound(source) && gives(source, value, question))
		return { verdict: 'right', matched: null, source, remarks };
	if (!gives(source, value, question)) {
		remarks.push({ code: 'not-from-evidence', text: 'The reading you attached does not give this number.' });
	} else if (!supports(source, question)) {
		remarks.push({
			code: 'other-quantity',
			text: 'The number is right, but the reading you attached is of something else.'
		});
	}
	return { verdict: 'right-but-method', matched: faults(source)[0] ?? null, source, remarks };
}
