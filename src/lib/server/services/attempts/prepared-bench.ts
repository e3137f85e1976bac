import type { Exercise as ExerciseDefinition } from '$lib/schemas/exercise';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { BenchError } from '$lib/server/bench/bench-error';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import type { DrawnExercise } from '$lib/server/bench/exercise/drawn-exercise';
import { ENGINE_VERSION } from '$lib/server/bench/receiver/random';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import type { SweepPlan } from '$lib/server/bench/receiver/sweep-plan';
import { DomainError } from '$lib/server/errors';
import { LeastRecentlyUsed } from '../process/least-recently-used';
import { RowClock } from './row-clock';

/** What names the signal of an attempt and nothing else. */
export interface SignalSource {
	id: number;
	seed: string;
	engineVersion: number;
	definition: ExerciseDefinition;
}

/** A set-up of an attempt, ready to sweep. */
export interface PreparedBench {
	seed: string;
	drawn: DrawnExercise;
	resolved: ResolvedSettings;
	plan: SweepPlan;
}

// Only caches: any process makes any entry again from the attempt's seed. Keyed by the seed, which never repeats.
const drawings = new LeastRecentlyUsed<string, DrawnExercise>(500);
const plans = new LeastRecentlyUsed<string, SweepPlan>(64);
const clocks = new LeastRecentlyUsed<string, RowClock>(64);

/** The attempt's exercise with its own numbers in it: scene and truths included. */
export const drawnFor = ({ seed, definition }: SignalSource): DrawnExercise =>
	drawings.get(seed, () => drawExercise(definition, seed));

/**
 * The settings as the attempt's receiver does them.
 * @throws DomainError `invalid` naming the entry, `settings.rbwHz`, when it can't
 */
export function resolvedFor(source: SignalSource, settings: Settings): ResolvedSettings {
	try {
		return resolveSettings(settings, drawnFor(source).profile);
	} catch (cause) {
		throw refusalOf(cause);
	}
}

/**
 * The attempt's receiver with these settings on its own signal. The first time takes up to some 50 ms.
 * @throws DomainError `invalid` naming the entry when the receiver can't do that; `conflict` when the sweep's arithmetic
 *   has changed since the attempt began, so that its rows can't be made again
 */
export function preparedBench(source: SignalSource, settings: Settings): PreparedBench {
	refuseOtherEngine(source);
	const drawn = drawnFor(source);
	const resolved = resolvedFor(source, settings);
	const { traces: _, referenceDbm: __, auto: ___, autoSweepTimeS: ____, ...swept } = resolved;
	const key = `${source.seed} ${JSON.stringify(swept)}`;
	try {
		const plan = plans.get(key, () => prepareSweep(drawn.scene, drawn.profile, resolved, source.seed));
		return { seed: source.seed, drawn, resolved, plan };
	} catch (cause) {
		throw refusalOf(cause);
	}
}

/** @throws DomainError `conflict` when the sweep's arithmetic has changed since the attempt began: its rows can't be made again */
export function refuseOtherEngine({ engineVersion }: SignalSource): void {
	if (engineVersion === ENGINE_VERSION) return;
	throw new DomainError(
		'conflict',
		'The bench has been renewed since this attempt began. Hand in, or start a new one.'
	);
}

/** When the rows of a set-up begin. @param plan of these settings */
export const rowClockOf = (
	seed: string,
	plan: SweepPlan,
	{ number, firstRow, clockS }: { number: number; firstRow: number; clockS: number }
): RowClock =>
	clocks.get(`${seed} ${number}`, () => new RowClock((row) => plan.durationS(row), firstRow, clockS));

function refusalOf(cause: unknown): unknown {
	if (!(cause instanceof BenchError)) return cause;
	const issues = [{ field: `settings.${cause.field}`, message: cause.message }];
	return new DomainError('invalid', 'The receiver can’t be set like that.', { issues });
}
