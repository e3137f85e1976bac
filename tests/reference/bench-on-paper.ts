/** An ideal receiver and the model analyser of the worked tasks, and short ways to sweep and read on them. */
import { takeReading } from '$lib/measure/take-reading';
import { isProblem } from '$lib/measure/reading';
import type { ReadingRequest } from '$lib/measure/reading-request';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Emitter, Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { sweepCommand } from '$lib/server/bench/commands/sweep-command';

const rbwHz = [1, 3, 10, 30, 100, 300, 1e3, 3e3, 10e3, 30e3, 100e3, 300e3, 1e6, 3e6];
/** No noise figure, no distortion, no errors. */
export const ideal: ReceiverProfile = {
	name: 'ideal',
	startHz: 0,
	stopHz: 50e9,
	noiseFigureDb: [{ frequencyHz: 1e9, db: 0 }],
	preamp: null,
	attenuatorDb: [0, 10, 20, 30],
	maxSafeInputDbm: 60,
	toiDbm: null,
	shiDbm: null,
	phaseNoise: null,
	residuals: [],
	referencePpm: 0,
	levelErrorDb: 0,
	rbwHz
};
/** The model of the worked tasks: NF 24 dB, TOI +15 and SHI +45 dBm at the mixer, no preamplifier. */
export const modelAnalyser: ReceiverProfile = {
	...ideal,
	name: 'model',
	noiseFigureDb: [{ frequencyHz: 1e9, db: 24 }],
	toiDbm: 15,
	shiDbm: 45
};

export interface Sweep {
	scene?: Scene;
	emitters?: Emitter[];
	receiver?: ReceiverProfile;
	settings: Settings;
	seed?: number | string;
	sweeps?: number;
}

export function sweep({ scene, emitters = [], receiver = ideal, settings, seed = 7, sweeps = 1 }: Sweep) {
	return sweepCommand({
		scene: scene ?? { emitters },
		receiver,
		settings: { attenuationDb: 0, ...settings },
		seed,
		sweeps
	});
}

/** A reading off trace 1 of a sweep. */
export function read(given: Sweep, request: ReadingRequest) {
	const result = sweep(given);
	const { startHz, stopHz, rbwHz: rbw, vbwHz, sweepTimeS, detector, scale, traces } = result;
	const [{ mode, levelsDbm }] = traces;
	const trace = {
		startHz,
		stopHz,
		rbwHz: rbw,
		vbwHz,
		sweepTimeS,
		detector,
		scale,
		mode,
		count: given.sweeps ?? 1,
		levelsDbm
	};
	const reading = takeReading(trace, request);
	if (isProblem(reading)) throw new Error(`${reading.kind}: ${reading.problem}`);
	return reading;
}

export const meanOf = (values: ArrayLike<number>): number =>
	Array.from(values).reduce((a, b) => a + b, 0) / values.length;
export const meanPowerDbm = (values: ArrayLike<number>): number =>
	10 * Math.log10(meanOf(Array.from(values, (l) => 10 ** (l / 10))));
