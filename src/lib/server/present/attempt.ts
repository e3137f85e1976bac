import type { AttemptView, BenchView, DraftsView, ReadingView } from '$lib/schemas/attempt';
import type { ExerciseView } from '$lib/schemas/exercise-view';
import type { Markings } from '$lib/schemas/markings';
import type { ReceiverFlag } from '$lib/schemas/sweep-stream';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';

/** What an attempt view is made of. The record holds the seed; only what stands here goes out. */
export interface AttemptParts {
	attempt: {
		id: number;
		number: number;
		practice: boolean;
		startedAt: Date;
		closedAt: Date | null;
		hintsRevealed: number;
	};
	triesLeft: number;
	exercise: ExerciseView;
	/** Every hint, shown or not. */
	hints: string[];
	bench: BenchView;
	readings: ReadingView[];
	drafts: DraftsView;
	markings: Markings | null;
}

export function presentAttempt(parts: AttemptParts): AttemptView {
	const { attempt, hints } = parts;
	return {
		id: attempt.id,
		number: attempt.number,
		practice: attempt.practice,
		triesLeft: parts.triesLeft,
		state: attempt.closedAt ? 'closed' : 'open',
		startedAt: attempt.startedAt.toISOString(),
		closedAt: attempt.closedAt?.toISOString() ?? null,
		exercise: parts.exercise,
		bench: parts.bench,
		readings: parts.readings,
		drafts: parts.drafts,
		markings: parts.markings,
		hints: { count: hints.length, revealed: hints.slice(0, attempt.hintsRevealed) }
	};
}

export interface BenchParts {
	attempt: { nextRow: number; clockS: number; protectionTripped: boolean };
	setUp: {
		number: number;
		firstRow: number;
		restartRow: number;
		drawnTo: number | null;
	} | null;
	/** The last row drawn of each set-up that was. */
	held: number[];
	settings: Settings;
	resolved: ResolvedSettings;
	flags: ReceiverFlag[];
}

export function presentBench({ attempt, setUp, held, settings, resolved, flags }: BenchParts): BenchView {
	const { nextRow, clockS } = attempt;
	const own = setUp?.drawnTo ?? null;
	const restartRow = setUp?.restartRow ?? nextRow;
	// Holds and averages may go on over set-ups: what an earlier one drew is still in them.
	const since = held.filter((row) => row >= restartRow);
	return {
		settings,
		resolved,
		setUp: setUp?.number ?? null,
		nextRow,
		drawnTo: since.length > 0 ? Math.max(...since) : null,
		resumeFrom: own === null ? (setUp?.firstRow ?? nextRow) : own + 1,
		restartRow,
		clockS,
		benchTimeUsedS: clockS,
		flags,
		protectionTripped: attempt.protectionTripped
	};
}

/** A warning as a page may know it: the figures of the others would tell the level at the input. */
export const presentFlag = ({ kind, db }: ReceiverFlag): ReceiverFlag =>
	kind === 'too-fast' ? { kind, db } : { kind };
