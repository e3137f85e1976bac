/** Lines that the receiver makes itself. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { lineOf } from '$lib/server/bench/signal/comb';
import { dbmToMilliwatts } from '$lib/units/decibel';
import { Random, type Seed } from '../random';
import type { FrontEndSettings } from './front-end-settings';
import type { ArrivedLine } from './incident-lines';
import type { PhaseNoise } from './skirt-shape';

/**
 * Residual responses and the local oscillator's feedthrough at 0 Hz. They arise behind the attenuator, so on the screen they
 * stand at their level + attenuation − gain. The feedthrough carries the oscillator's phase noise.
 */
export function ownLines(
	profile: ReceiverProfile,
	settings: FrontEndSettings,
	receiver: PhaseNoise | null,
	seed: Seed
): ArrivedLine[] {
	const gainDb = settings.preamp && profile.preamp ? profile.preamp.gainDb : 0;
	const shownMw = (levelDbm: number) => dbmToMilliwatts(levelDbm + settings.attenuationDb - gainDb);
	const random = new Random(seed, -1, 'phase/residuals');
	const at = (frequencyHz: number, levelDbm: number) =>
		lineOf(frequencyHz, shownMw(levelDbm), 2 * Math.PI * random.uniform());
	const residuals = profile.residuals.map(({ frequencyHz, levelDbm }) => ({
		line: at(frequencyHz, levelDbm),
		skirts: [],
		arrivals: []
	}));
	if (profile.loFeedthroughDbm === undefined) return residuals;
	const feedthrough = at(0, profile.loFeedthroughDbm);
	return [
		...residuals,
		{
			line: { ...feedthrough, ...(receiver && { skirt: [receiver.points] }) },
			skirts: receiver ? [{ noise: receiver, powerMw: shownMw(profile.loFeedthroughDbm) }] : [],
			arrivals: []
		}
	];
}
