import { combineRows } from '$lib/measure/combine-rows';
import { sweepInput, type SweepInput } from '$lib/schemas/bench-command';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { profileNamed } from '../receiver/profiles';
import { resolveSettings } from '../receiver/resolve-settings';
import { prepareSweep } from '../receiver/sweep';
import { parseInput } from './parse-input';

/** Levels to 10⁻⁴ dB: finer than any spread, and short to read. */
const rounded = (levels: ArrayLike<number>): number[] =>
	Array.from(levels, (level) => Math.round(level * 1e4) / 1e4);

export const profileOf = (receiver: SweepInput['receiver']): ReceiverProfile =>
	typeof receiver === 'string' ? profileNamed(receiver) : receiver;

/** `sweep`: rows and traces of a scene on a receiver, from row 0 at bench clock 0. @throws BenchError by field */
export function sweepCommand(input: unknown) {
	const { scene, receiver, settings, seed, sweeps } = parseInput(sweepInput, input);
	const profile = profileOf(receiver);
	const resolved = resolveSettings(settings, profile);
	const plan = prepareSweep(scene, profile, resolved, seed);
	const rows: Float32Array[] = [];
	let clockS = 0;
	for (let n = 0; n < sweeps && !plan.isProtected; n++) {
		rows.push(plan.row(n, clockS));
		clockS += plan.durationS(n);
	}
	const { startHz, stopHz, points, rbwHz, vbwHz, sweepTimeS, attenuationDb, detector, scale } = resolved;
	return {
		startHz,
		stopHz,
		points,
		rbwHz,
		vbwHz,
		sweepTimeS,
		attenuationDb,
		detector,
		scale,
		flags: plan.flags,
		levelsDbm: rows.map(rounded),
		traces: resolved.traces.map(({ mode, count }) => ({
			mode,
			levelsDbm: rows.length === 0 ? [] : rounded(combineRows(rows, mode, count, scale))
		}))
	};
}
