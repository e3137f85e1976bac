import type { FindingPlot } from '$lib/schemas/questions/finding';
import type { Scene } from '$lib/schemas/scene';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { milliwattsToDbm } from '$lib/units/decibel';
import { placeEmitters } from '../truth/place-emitters';
import { powerBetween, spectrumOf } from '../truth/spectrum';

const POINTS = 401;
/** Slices per resolution bandwidth: the Gaussian filter is then followed to 0.01 dB. */
const SLICES = 4;
/** How far the filter is followed, in its own widths: 60 dB down is at 2.2. */
const REACH = 2.5;
/** Levels below this are not drawn any lower. */
const FLOOR_DBM = -180;

/** The signal itself at the reference plane, as a noise-free receiver with this resolution bandwidth would show it. */
export function signalLevels(
	scene: Scene,
	{ startHz, stopHz, rbwHz }: ResolvedSettings
): FindingPlot['signal'] {
	if (stopHz <= startHz) return null;
	const step = (stopHz - startHz) / (POINTS - 1);
	const sliceHz = Math.max(rbwHz, step) / SLICES;
	const first = Math.max(0, startHz - REACH * rbwHz);
	const count = Math.ceil((stopHz + REACH * rbwHz - first) / sliceHz);
	const spectrum = spectrumOf(placeEmitters(scene, { kind: 'peak' }), scene.device);
	const slices = Float64Array.from({ length: count }, (_, i) =>
		powerBetween(spectrum, first + i * sliceHz, first + (i + 1) * sliceHz)
	);
	const reachSlices = Math.ceil((REACH * Math.max(rbwHz, step)) / sliceHz);
	const levelsDbm = Array.from({ length: POINTS }, (_, point) => {
		const tuned = startHz + point * step;
		const middle = Math.round((tuned - first) / sliceHz - 0.5);
		let power = 0;
		for (let i = Math.max(0, middle - reachSlices); i <= Math.min(count - 1, middle + reachSlices); i++) {
			const offset = (first + (i + 0.5) * sliceHz - tuned) / rbwHz;
			power += slices[i] * 2 ** -((2 * offset) ** 2);
		}
		return Math.max(FLOOR_DBM, power > 0 ? milliwattsToDbm(power) : FLOOR_DBM);
	});
	return { startHz, stopHz, rbwHz, levelsDbm };
}
