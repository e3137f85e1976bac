import type { TrialSweep } from '$lib/schemas/trial';
import { seal, unseal } from '$lib/server/auth/seal';
import { BenchError } from '$lib/server/bench/bench-error';
import { drawExercise } from '$lib/server/bench/exercise/draw-exercise';
import type { DrawnExercise } from '$lib/server/bench/exercise/drawn-exercise';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { prepareSweep } from '$lib/server/bench/receiver/sweep';
import type { SweepPlan } from '$lib/server/bench/receiver/sweep-plan';
import { trialSetUp } from '$lib/server/bench/trial/trial-set-up';
import { Exercise } from '$lib/server/db/models/exercise';
import { findTrialId } from '$lib/server/db/queries/find-trial';
import { DomainError } from '$lib/server/errors';
import { LeastRecentlyUsed } from '../process/least-recently-used';

const PURPOSE = 'trial';
/** A visitor may think for as long as this. */
const LIFETIME_MS = 2 * 60 * 60 * 1000;

// Only caches: the token names the signal, and any process makes it again.
const drawings = new LeastRecentlyUsed<string, DrawnExercise>(200);
// Exercises never change once published.
const exercises = new LeastRecentlyUsed<number, Promise<Exercise | null>>(4);
const plans = new LeastRecentlyUsed<string, SweepPlan>(200);

/** One visitor's bench: nothing of it is kept, the sealed token holds it all. */
export interface TrialBench {
	exercise: Exercise;
	seed: string;
	drawn: DrawnExercise;
}

const benchOf = (exercise: Exercise, seed: string): TrialBench => ({
	exercise,
	seed,
	drawn: drawings.get(`${exercise.id} ${seed}`, () => drawExercise(exercise.definition, seed))
});

function exerciseCalled(id: number): Promise<Exercise | null> {
	const found = exercises.get(id, () => Exercise.findByPk(id));
	// A database that was away for a moment must not be remembered.
	found.catch(() => exercises.forget(id));
	return found;
}

/** @throws DomainError `not_found` when no exercise is open to trial */
export async function trialExercise(): Promise<Exercise> {
	const id = await findTrialId();
	const exercise = id === undefined ? null : await exerciseCalled(id);
	if (!exercise) throw new DomainError('not_found', 'There is nothing to try at the moment.');
	return exercise;
}

/** A bench of this seed, and the token that opens it again. */
export async function newTrialBench(exercise: Exercise, seed: string, now: Date) {
	const expiresAt = new Date(now.getTime() + LIFETIME_MS);
	const token = await seal(PURPOSE, { text: `${exercise.id} ${seed}`, expiresAt });
	return { token, bench: benchOf(exercise, seed) };
}

/** @throws DomainError `conflict` for a token that has run out, is not ours, or is of an earlier edition */
export async function openTrialBench(token: string, now: Date): Promise<TrialBench> {
	const text = await unseal(PURPOSE, token, now);
	const exercise = await trialExercise();
	const [id, seed] = text?.split(' ') ?? [];
	if (!seed || Number(id) !== Number(exercise.id)) {
		throw new DomainError('conflict', 'This bench has been put away. Take a new signal.');
	}
	return benchOf(exercise, seed);
}

/** Sweep `row` through resolution `choice`. @throws DomainError `invalid` for a choice that isn't offered */
export function sweepTrial({ drawn, seed, exercise }: TrialBench, choice: number, row: number): Float32Array {
	try {
		const plan = plans.get(`${exercise.id} ${seed} ${choice}`, () => {
			const resolved = resolveSettings(trialSetUp(drawn, choice), drawn.profile);
			return prepareSweep(drawn.scene, drawn.profile, resolved, seed);
		});
		return plan.row(row, row * plan.durationS(0));
	} catch (cause) {
		if (!(cause instanceof BenchError)) throw cause;
		const issues = [{ field: cause.field, message: cause.message }];
		throw new DomainError('invalid', 'The receiver can’t be set like that.', { issues });
	}
}

/** As it goes out: hundredths of a decibel are a fortieth of a pixel. */
export const presentSweep = (choice: number, row: number, levelsDbm: Float32Array): TrialSweep => ({
	choice,
	row,
	levelsDbm: Array.from(levelsDbm, (levelDbm) => Math.round(levelDbm * 100) / 100)
});
