import type { UncertaintyAnswer } from '$lib/server/bench/exercise/attempt-record';
import type { FilledStep, UncertaintyQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import type { WrongWay } from '../question-type';
import { knownSlips } from './known-slips';
import { combined } from './standard';

/** Slips that give numbers nearer to each other than this share can't be told apart. */
const ALIKE = 0.13;

/** The taught value with the uncertainty that each usual slip gives, where that is a wrong one and like no other. */
export function wrongBudgets(question: UncertaintyQuestion): WrongWay[] {
	const { id, budget, spreadDb, within, leadDb, toleranceDb } = question;
	const k = 2;
	const right = k * combined([...budget.map(({ standardDb }) => standardDb), spreadDb]);
	const slips = knownSlips(question, spreadDb, k);
	const clear = slips.filter(
		(slip) =>
			Math.abs(slip.expandedDb / right - 1) > within + ALIKE / 2 &&
			slips.every((other) => other === slip || Math.abs(other.expandedDb / slip.expandedDb - 1) > ALIKE)
	);
	const way = (name: string, change: (answer: UncertaintyAnswer) => UncertaintyAnswer): WrongWay => ({
		id: name,
		make: (steps) =>
			steps.map((step): FilledStep => {
				if (step.do !== 'answer' || step.question !== id || !('gives' in step)) return step;
				return { ...step, gives: (from) => change(step.gives(from) as UncertaintyAnswer) };
			}),
		isNamed: ({ mistakes }) => mistakes.length === 1 && mistakes[0].kind === name
	});
	return [
		...clear.map(({ kind, expandedDb }) => way(kind, (answer) => ({ ...answer, expandedDb, k }))),
		way('overstated', (answer) => ({ ...answer, expandedDb: 7 * right, k })),
		...(leadDb > 2 * toleranceDb
			? [way('lead-left-out', (answer) => ({ ...answer, stated: answer.stated - leadDb }))]
			: [])
	];
}
