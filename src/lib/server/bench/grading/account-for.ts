import type { Candidate } from './explanations';
import type { Explanation } from './mistake';
import type { Judgement } from './judge-question';
import { worthAStep } from './spreads';
import type { Watched } from './watched-mistakes';

/** One mistake's share of the way from the learner's number to the true one, explained. */
export interface Account {
	watched?: Watched;
	from: number;
	to: number;
	change: number;
	explanation?: Explanation;
	text: string;
}

/** Changes that the mistakes of a candidate make good, reading first, then sums; what is left goes to what was read. */
function changesOf(
	matched: Candidate,
	total: number,
	{ evidence }: Judgement
): { watched?: Watched; change: number }[] {
	const slips = matched.watched.flatMap((watched) =>
		watched.mistake.stage === 'slip'
			? [{ watched, change: -(watched.mistake.change(evidence, matched.setUp, matched.source) ?? 0) }]
			: []
	);
	const rest = total - slips.reduce((sum, { change }) => sum + change, 0);
	const readings = matched.watched.filter(({ mistake }) => mistake.stage === 'reading');
	if (readings.length === 0) {
		return Math.abs(rest) < worthAStep(evidence.question) ? slips : [...slips, { change: rest }];
	}
	let left = rest;
	const shares = readings.map((watched, i) => {
		const last = i === readings.length - 1;
		const change = last
			? left
			: Math.max(-Math.abs(left), Math.min(Math.abs(left), predictedChange(watched, matched, evidence)));
		left -= change;
		return { watched, change };
	});
	return [...shares, ...slips];
}

function predictedChange(
	{ mistake }: Watched,
	{ setUp }: Candidate,
	evidence: Judgement['evidence']
): number {
	if (mistake.stage !== 'reading' || !setUp) return 0;
	const predicted = mistake.predict(evidence, setUp);
	return predicted ? evidence.question.truth - predicted.value : 0;
}

/** The way from the learner's number to the true one, mistake by mistake. */
export function accountFor(judgement: Judgement, matched: Candidate, yours: number): Account[] {
	const { evidence } = judgement;
	const { question, drawn } = evidence;
	let from = yours;
	return changesOf(matched, question.truth - yours, judgement).map(({ watched, change }) => {
		const to = from + change;
		const facts = { drawn, question, source: matched.source, setUp: matched.setUp, yours: from, change };
		const explanation = watched?.mistake.explain(facts);
		const text = explanation?.part ?? 'the receiver’s own error and noise';
		const account = { watched, from, to, change, explanation, text };
		from = to;
		return account;
	});
}
