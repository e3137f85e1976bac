import type { ResolvedSettings } from '$lib/schemas/settings';
import type { AttemptRecord } from '$lib/server/bench/exercise/attempt-record';
import type { DrawnExercise } from '$lib/server/bench/exercise/drawn-exercise';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';

/** A set-up of the log as it was swept, before the scene that it swept. */
export interface SweptSetUp {
	drawn: Pick<DrawnExercise, 'scene' | 'profile'>;
	resolved: ResolvedSettings;
	/** Sweeps drawn with it. */
	sweeps: number;
}

/** Null for an entry that is not there, or that nothing was swept with. */
export function setUpAt(drawn: DrawnExercise, { log }: AttemptRecord, entry: number): SweptSetUp | null {
	const logged = log.at(entry);
	if (!logged || entry < 0 || logged.sweeps === 0) return null;
	return { drawn, resolved: resolveSettings(logged.settings, drawn.profile), sweeps: logged.sweeps };
}
