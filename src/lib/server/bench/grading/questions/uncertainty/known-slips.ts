import type { FindingMistake } from '$lib/schemas/questions/finding';
import type { UncertaintyQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { combined } from './standard';

/** A usual slip with a budget: what it gives for the expanded uncertainty, and what is said of it. */
export interface Slip extends FindingMistake {
	expandedDb: number;
}

/** Every usual slip with this budget, at a coverage factor. */
export function knownSlips({ budget }: UncertaintyQuestion, spreadDb: number, k: number): Slip[] {
	const standards = [...budget.map(({ standardDb }) => standardDb), spreadDb];
	const without = (id: string) =>
		combined([...budget.filter((one) => one.id !== id).map(({ standardDb }) => standardDb), spreadDb]);
	return [
		{
			kind: 'standard-for-expanded',
			title: 'A standard uncertainty is not an expanded one',
			text: 'Your figure is the combined standard uncertainty. It is stated with a coverage factor, so it is multiplied by that.',
			expandedDb: combined(standards)
		},
		{
			kind: 'limits-for-standards',
			title: 'Limits were taken for standard uncertainties',
			text: 'A ± out of a data sheet is the limit of what is possible. Divide it by √3 where anything inside is as likely, then combine.',
			expandedDb: k * combined([...budget.map(({ db }) => db), spreadDb])
		},
		{
			kind: 'added-up',
			title: 'Contributions were added up',
			text: 'That they are all at their worst and on one side is next to impossible. Independent ones combine as the root of the sum of squares.',
			expandedDb: k * standards.reduce((sum, one) => sum + one, 0)
		},
		...budget.map(({ id, text }) => ({
			kind: `left-out-${id}`,
			title: `Left out: ${text}`,
			text: 'Your figure is what the rest of the budget gives.',
			expandedDb: k * without(id)
		}))
	];
}
