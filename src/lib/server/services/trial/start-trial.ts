import { randomBytes } from 'node:crypto';
import type { TrialView } from '$lib/schemas/trial';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { trialSetUp } from '$lib/server/bench/trial/trial-set-up';
import { presentTolerance, presentUnits } from '$lib/server/present/question';
import { trialSweeps } from './trial-limits';
import { newTrialBench, presentSweep, sweepTrial, trialExercise } from './trial-bench';

/**
 * A signal of the visitor's own to try the bench on. Needs no account and stores nothing.
 * @throws DomainError `not_found` when nothing is open to trial; `too_many`
 */
export async function startTrial(address: string, now: Date): Promise<TrialView> {
	trialSweeps.spend(address, now);
	const exercise = await trialExercise();
	const { token, bench } = await newTrialBench(exercise, randomBytes(16).toString('hex'), now);
	const { trial, questions, slug, title } = exercise.definition;
	const written = questions.find(({ id }) => id === trial?.question);
	if (!trial || written?.type !== 'number')
		throw new Error(`${slug} is open to trial without a number to ask for`);
	const { startHz, stopHz, referenceDbm } = resolveSettings(trialSetUp(bench.drawn, 0), bench.drawn.profile);
	return {
		token,
		question: trial.text,
		unit: written.unit,
		units: presentUnits(written.unit),
		toleranceText: presentTolerance(written.tolerance, written.unit),
		startHz,
		stopHz,
		referenceDbm,
		resolutionsHz: trial.resolutionsHz,
		first: presentSweep(0, 0, sweepTrial(bench, 0, 0)),
		exercise: { slug, title }
	};
}
