/** What a set-up shows on average, by theory: the trace that endless patience would draw. */
import type { Trace } from '$lib/measure/trace';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { ResolvedSettings } from '$lib/schemas/settings';
import type { Scene } from '$lib/schemas/scene';
import { milliwattsToDbm } from '$lib/units/decibel';
import type { DrawnExercise } from '../exercise/drawn-exercise';
import { lossDbAt } from '../exercise/loss-db-at';
import { prepareIncident } from '../receiver/front-end/prepare-incident';
import type { Incident } from '../receiver/incident';
import { gaussianConstant } from '../receiver/resolution-filter';
import { normalIntegral } from '../signal/normal-integral';

type Drawn = Pick<DrawnExercise, 'scene' | 'seed'>;

const drawnTraces = new WeakMap<Scene, Map<string, Trace>>();

/**
 * Mean power against frequency at the reference plane, dBm, as a receiver of this profile shows it with these settings and no
 * error of its own: its floor, its mixer's products and its phase noise included. Lines as if they never met in phase.
 */
export function shownTrace(drawn: Drawn, profile: ReceiverProfile, resolved: ResolvedSettings): Trace {
	const { startHz, stopHz, points, rbwHz, attenuationDb, preamp, input } = resolved;
	const seen = [
		profile.name,
		startHz,
		stopHz,
		points,
		rbwHz,
		attenuationDb,
		preamp,
		input,
		resolved.detector
	];
	const key = JSON.stringify(seen);
	const traces = drawnTraces.get(drawn.scene) ?? new Map<string, Trace>();
	drawnTraces.set(drawn.scene, traces);
	const trace = traces.get(key) ?? makeTrace(drawn, profile, resolved);
	traces.set(key, trace);
	return trace;
}

function makeTrace({ scene, seed }: Drawn, profile: ReceiverProfile, resolved: ResolvedSettings): Trace {
	const { startHz, stopHz, points, rbwHz, vbwHz, sweepTimeS, input } = resolved;
	const stepHz = (stopHz - startHz) / (points - 1);
	const wide = prepareIncident(scene, profile, resolved, seed);
	const power = noiseMw(scene, profile, resolved, seed, wide);
	const levelsDbm = Float64Array.from({ length: points }, (_, i) => {
		const frequencyHz = startHz + i * stepHz;
		const backDb = input.padDb + (scene.path ? lossDbAt(scene.path, frequencyHz) : 0);
		return milliwattsToDbm(power(frequencyHz) + linesMw(wide, frequencyHz, resolved, stepHz)) + backDb;
	});
	return {
		startHz,
		stopHz,
		rbwHz,
		vbwHz,
		sweepTimeS,
		detector: 'average',
		scale: 'power',
		mode: 'live',
		levelsDbm
	};
}

/** Standard deviations of the filter beyond which its gain is no number any more. */
const NOTHING_BEYOND = 39;

/** Lines through the filter, mW; a mean over the point's bucket where the detector averages. */
function linesMw(
	{ lines }: Incident,
	frequencyHz: number,
	{ rbwHz, detector }: ResolvedSettings,
	stepHz: number
): number {
	const sigmaHz = 1 / (2 * Math.sqrt(gaussianConstant(rbwHz)));
	const share = (offsetHz: number): number => {
		if (offsetHz - stepHz > NOTHING_BEYOND * sigmaHz) return 0;
		if (detector !== 'average') return Math.exp(-0.5 * (offsetHz / sigmaHz) ** 2);
		const low = (offsetHz - 0.5 * stepHz) / sigmaHz;
		const high = (offsetHz + 0.5 * stepHz) / sigmaHz;
		const bellHz = Math.sqrt(2 * Math.PI) * sigmaHz;
		return (bellHz / stepHz) * (normalIntegral(high) - normalIntegral(low));
	};
	let sum = 0;
	for (const line of lines)
		sum += (line.re ** 2 + line.im ** 2) * share(Math.abs(frequencyHz - line.frequencyHz));
	return sum;
}

/** How often the filter is halved at most until everything modulated is a density to it. */
const MOST_HALVINGS = 12;
/** Reach of the widening filter, in its own widths: −50 dB. */
const REACH = 2.1;

/**
 * Everything but lines through the filter, mW. What the filter follows as a waveform is taken through one so narrow that it is
 * a density, and widened: the variances of Gaussian filters add.
 */
function noiseMw(
	scene: Scene,
	profile: ReceiverProfile,
	resolved: ResolvedSettings,
	seed: DrawnExercise['seed'],
	wide: Incident
): (frequencyHz: number) => number {
	const { rbwHz, startHz, stopHz } = resolved;
	let narrowHz = rbwHz;
	let incident = wide;
	for (let i = 0; incident.envelopes.length > 0 && i < MOST_HALVINGS; i++) {
		narrowHz /= 2;
		incident = prepareIncident(scene, profile, { ...resolved, rbwHz: narrowHz }, seed);
	}
	const through = (frequencyHz: number) =>
		incident.noises.reduce((sum, noise) => sum + noise.variance(frequencyHz), 0);
	if (narrowHz === rbwHz) return through;
	const widerHz = Math.sqrt(rbwHz ** 2 - narrowHz ** 2);
	const stepHz = narrowHz / 2;
	const reach = Math.ceil((REACH * widerHz) / stepHz);
	const first = startHz - reach * stepHz;
	const cells = Float64Array.from(
		{ length: Math.ceil((stopHz - startHz) / stepHz) + 2 * reach + 2 },
		(_, i) => through(first + i * stepHz)
	);
	const exponent = -2 * gaussianConstant(widerHz) * stepHz ** 2;
	const kernel = Float64Array.from({ length: 2 * reach + 1 }, (_, i) =>
		Math.exp(exponent * (i - reach) ** 2)
	);
	const gain = rbwHz / narrowHz / kernel.reduce((a, b) => a + b, 0);
	return (frequencyHz) => {
		const middle = Math.round((frequencyHz - first) / stepHz);
		let sum = 0;
		for (let k = -reach; k <= reach; k++) sum += (cells[middle + k] ?? 0) * kernel[k + reach];
		return sum * gain;
	};
}
