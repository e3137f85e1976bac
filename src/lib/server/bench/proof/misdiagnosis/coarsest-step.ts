import type { FilledStep, NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { familyOf } from '$lib/server/bench/grading/family';

/** Points farther apart than this share of the filter miss what stands between them, and a sum over them loses power. */
const LARGEST_STEP = 0.6;
/** Coarser than this, readings of a line remark on it: its top may stand 0.19 dB above the nearest point (`measure/remarks.ts`). */
const LARGEST_STEP_ON_A_LINE = 1 / 4;
/** Of the tolerance; rounding what was read takes up to the third that is left. */
const SHARE_OF_TOLERANCE = 2 / 3;

/**
 * How far apart people choose their points to lie, Hz. Whoever is asked for a frequency or a distance in frequency and told how
 * right it must be looks to it that the points can give it: two markers, each half a step beside its line, are one step out
 * between them. Not to do so is a mistake of its own, `coarse-points`, and none that comes along with another.
 * @param rbwHz filter in use
 * @param sound whether a careful person chooses, who reads no line's level off points that miss its top
 */
export function coarsestStepHz(
	rbwHz: number,
	{ steps, question, sound }: { steps: readonly FilledStep[]; question: NumberQuestion; sound: boolean }
): number {
	const readsLines = steps.some(
		(step) => step.do === 'read' && ['point', 'delta'].includes(familyOf(step.reading.kind))
	);
	const forFilter = rbwHz * (sound && readsLines ? LARGEST_STEP_ON_A_LINE : LARGEST_STEP);
	const { unit, quantity, tolerance } = question;
	// a count is as good with few points as with many
	if (unit !== 'Hz' || quantity.kind === 'count') return forFilter;
	return Math.min(forFilter, SHARE_OF_TOLERANCE * tolerance);
}
