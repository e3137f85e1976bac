import type { FindingNumberLine } from '$lib/schemas/questions/finding';
import type { Judgement } from './judge-question';
import type { Context, Prediction, SetUp } from './mistake';
import { predictMistake } from './predict-mistake';
import type { Watched } from './watched-mistakes';

/** What each mistake watched would have given on this signal, with the answer and the truth among them. */
export function numberLine({ evidence, watched, matched, verdict, source }: Judgement): FindingNumberLine {
	const { question, answer } = evidence;
	const marks: FindingNumberLine['marks'] = [];
	const mark = (value: number, label: string, role: 'yours' | 'true' | 'mistake', isMatched = false) =>
		marks.push({ value, label, role, matched: isMatched });
	if (answer) mark(answer.value, 'yours', 'yours');
	mark(question.truth, 'true', 'true');
	const found = verdict === 'wrong' ? matched : null;
	const alone = found?.watched.length === 1 ? found.watched[0] : undefined;
	for (const one of watched) {
		if (one === alone) continue;
		const setUp = found?.setUp ?? source?.setUp;
		const predicted = predictedOn(one, evidence, setUp);
		if (predicted) mark(predicted.value, one.mistake.label, 'mistake');
	}
	if (found) mark(found.value, found.watched.map(({ mistake }) => mistake.label).join(', '), 'mistake', true);
	return { unit: question.unit, marks };
}

/** A marker's number hangs on the learner's own bandwidth; everything else is as the taught method would have it. */
function predictedOn(watched: Watched, context: Context, setUp: SetUp | undefined): Prediction | null {
	const { mistake } = watched;
	const ofPoint =
		mistake.stage === 'reading' && mistake.families !== 'all' && mistake.families.includes('point');
	return (ofPoint && setUp && mistake.predict(context, setUp)) || predictMistake(watched, context);
}
