/** Which units are open to a learner: a unit may need others done first. */

export interface UnitStanding {
	slug: string;
	number: number;
	title: string;
	/** Slugs of the units that come first. */
	needs: readonly string[];
	/** So many of its exercises right, and the unit is done. */
	doneWith: number;
	/** Exercises that this person has had right, whether in an attempt that counts or in practice. */
	right: number;
}

export interface Lock {
	/** What opens the unit, in one sentence. */
	text: string;
	/** The units still to be done. */
	needs: { number: number; slug: string; title: string }[];
}

const isDone = ({ right, doneWith }: UnitStanding): boolean => right >= doneWith;

/**
 * What holds a unit shut; null when it is open. Practice opens units too: otherwise tries used up would shut a course for good.
 * @param all the course's units; a need that isn't among them holds nothing shut
 */
export function lockOf(unit: Pick<UnitStanding, 'needs'>, all: readonly UnitStanding[]): Lock | null {
	const unmet = all.filter((other) => unit.needs.includes(other.slug) && !isDone(other));
	if (unmet.length === 0) return null;
	const names = unmet.map(({ number, title }) => `unit ${number}, ${title}`).join(' and ');
	const missing = unmet.map(({ number, right, doneWith }) => {
		const count = doneWith - right;
		const where = unmet.length === 1 ? 'there' : `of unit ${number}`;
		return `${count}${right > 0 ? ' more' : ''} ${count === 1 ? 'exercise' : 'exercises'} right ${where}`;
	});
	const several = unmet.length > 1 || unmet[0].doneWith - unmet[0].right > 1;
	return {
		text: `First ${unmet.length > 1 ? 'come' : 'comes'} ${names}: ${missing.join(' and ')} ${several ? 'open' : 'opens'} this unit.`,
		needs: unmet.map(({ number, slug, title }) => ({ number, slug, title }))
	};
}
