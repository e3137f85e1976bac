/**
 * How well a skill is mastered, from the answers to its questions. The last eight count; the newest weighs 1 and each one
 * before it 0.8 of the one after. Right is worth 1, right by a faulty method ½, anything else nothing. The weighted share
 * makes the level: common practice in its shape, ours in its numbers.
 */

export const LAST_COUNTED = 8;
const FADE = 0.8;
/** A level needs a share, and enough answers for the share to mean something. */
const RULES = [
	{ level: 'sure', share: 0.85, answers: 4 },
	{ level: 'on the way', share: 0.5, answers: 2 },
	{ level: 'begun', share: 0, answers: 1 }
] as const;

export const levels = ['not begun', 'begun', 'on the way', 'sure'] as const;
export type Level = (typeof levels)[number];
/** What an answer is worth. */
export type Worth = 0 | 0.5 | 1;

export interface Mastery {
	level: Level;
	/** 0 … 1; null before the first answer. */
	share: number | null;
	/** So many answers right in a row from now on reach the next level; null when there is none above. */
	raise: { answers: number; level: Level } | null;
}

/** @param verdict as the grader gives it */
export const worthOf = (verdict: string | null): Worth =>
	verdict === 'right' ? 1 : verdict === 'right-but-method' ? 0.5 : 0;

/** @param worths of every answer to the skill's questions, oldest first */
export function masteryOf(worths: readonly Worth[]): Mastery {
	const level = levelOf(worths);
	return { level, share: worths.length === 0 ? null : shareOf(worths), raise: raiseOf(worths, level) };
}

function shareOf(worths: readonly Worth[]): number {
	const counted = worths.slice(-LAST_COUNTED).toReversed();
	const weights = counted.map((_, back) => FADE ** back);
	const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);
	return sum(counted.map((worth, back) => worth * weights[back])) / sum(weights);
}

function levelOf(worths: readonly Worth[]): Level {
	if (worths.length === 0) return 'not begun';
	const share = shareOf(worths);
	const counted = Math.min(worths.length, LAST_COUNTED);
	return RULES.find((rule) => share >= rule.share && counted >= rule.answers)?.level ?? 'begun';
}

function raiseOf(worths: readonly Worth[], level: Level): Mastery['raise'] {
	for (let answers = 1; answers <= LAST_COUNTED; answers++) {
		const then = levelOf([...worths, ...Array<Worth>(answers).fill(1)]);
		if (levels.indexOf(then) > levels.indexOf(level)) return { answers, level: then };
	}
	return null;
}
