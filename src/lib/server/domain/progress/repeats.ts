/** Spaced repeats: what was missed comes back, with a fresh signal, after growing intervals. */

/** Days between one answer and the next repeat. */
export const GAPS_DAYS = [1, 3, 7, 21] as const;
const DAY_MS = 86_400_000;
/** Half a day early: what was missed in an afternoon is due the next morning. */
const GRACE_MS = DAY_MS / 2;

/** An attempt that has been handed in or given up. */
export interface ClosedAttempt {
	closedAt: Date;
	/** Not every answer was right, or one was right by a faulty method. */
	missed: boolean;
}

export interface Repeat {
	/** When it was missed last. */
	missedAt: Date;
	/** From when on it is to be repeated. */
	dueAt: Date;
	/** 0 … 3: how many of the four gaps lie behind it. */
	step: number;
}

/**
 * When an exercise comes back. A miss puts it in; each repeat that is right at its time moves it to the next gap, and after the
 * last gap it is let go; each miss takes it one gap back. What is right before its time proves little and moves nothing.
 * @param closed this person's attempts at the exercise, in the order they closed
 * @returns null when there is nothing to repeat
 */
export function repeatOf(closed: readonly ClosedAttempt[]): Repeat | null {
	let repeat: Repeat | null = null;
	for (const { closedAt, missed } of closed) {
		if (missed) repeat = after(closedAt, closedAt, Math.max(0, (repeat?.step ?? 0) - 1));
		else if (repeat && isDue(repeat, closedAt)) {
			const step: number = repeat.step + 1;
			repeat = step < GAPS_DAYS.length ? after(closedAt, repeat.missedAt, step) : null;
		}
	}
	return repeat;
}

export const isDue = ({ dueAt }: Repeat, now: Date): boolean => now.getTime() >= dueAt.getTime();

const after = (answeredAt: Date, missedAt: Date, step: number): Repeat => ({
	missedAt,
	dueAt: new Date(answeredAt.getTime() + GAPS_DAYS[step] * DAY_MS - GRACE_MS),
	step
});
