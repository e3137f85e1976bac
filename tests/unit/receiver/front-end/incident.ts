/** Scenes before a receiver, and what meets its resolution filter. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { scene as sceneSchema, type Emitter, type Scene } from '$lib/schemas/scene';
import type { Settings } from '$lib/schemas/settings';
import { prepareIncident } from '$lib/server/bench/receiver/front-end/prepare-incident';
import { resolveSettings } from '$lib/server/bench/receiver/resolve-settings';
import { field } from '$lib/server/bench/receiver/profiles';

export const dbm = (milliwatts: number) => 10 * Math.log10(milliwatts);
export const powerOf = ({ re, im }: { re: number; im: number }) => re * re + im * im;
export const ideal: ReceiverProfile = {
	...field,
	name: 'ideal',
	startHz: 0,
	toiDbm: null,
	shiDbm: null,
	phaseNoise: null,
	residuals: [],
	loFeedthroughDbm: undefined,
	referencePpm: 0
};
export const common: Settings = { rbwHz: 100e3, attenuationDb: 0 };
export const here: Settings = { centreHz: 1e9, spanHz: 20e6, ...common };
export const incident = (
	emitters: Emitter[],
	{
		scene = {},
		profile = ideal,
		settings = {}
	}: { scene?: Partial<Scene>; profile?: ReceiverProfile; settings?: Settings } = {}
) =>
	prepareIncident(
		sceneSchema.parse({ emitters, ...scene }),
		profile,
		resolveSettings({ ...(settings.startHz === undefined ? here : common), ...settings }, profile),
		1
	);
export const tone = (frequencyHz: number, levelDbm: number, more = {}): Emitter => ({
	kind: 'cw',
	frequencyHz,
	levelDbm,
	...more
});
export const qpsk = (more = {}): Emitter => ({
	kind: 'digital',
	frequencyHz: 1e9,
	levelDbm: -30,
	symbolRateHz: 4e6,
	rollOff: 0.22,
	order: 4,
	...more
});
