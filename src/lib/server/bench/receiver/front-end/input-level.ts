/** Levels that harm or overload the receiver, judged on totals. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Emitter, Scene } from '$lib/schemas/scene';
import { kindOf } from '$lib/server/bench/signal/kinds';
import { milliwattsToDbm } from '$lib/units/decibel';
import { voltsToDbm } from '$lib/units/level';
import type { Incident } from '../incident';
import type { FrontEndSettings } from './front-end-settings';

/** Direct voltage that the input stands without a block, V: an offset, not a supply. */
export const SAFE_DC_VOLTS = 0.05;
/** The input of a pure cubic stage is compressed by 1 dB this far under its third-order intercept, dB: −10·lg(1 − 10^−0.05). */
export const COMPRESSION_UNDER_TOI_DB = -10 * Math.log10(1 - 10 ** -0.05);
/** Overload is shown this far before 1 dB compression. */
const OVERLOAD_MARGIN_DB = 3;

/** Frequencies at which an emitter may be found. */
function placesHz(emitter: Emitter): number[] {
	if (emitter.kind === 'dc') return [0];
	if (emitter.kind === 'noise') {
		// A wide band through a sloping path: the mean over it.
		return Array.from(
			{ length: 33 },
			(_, i) => emitter.startHz + ((emitter.stopHz - emitter.startHz) * i) / 32
		);
	}
	return emitter.hop ? emitter.hop.channelsHz : [emitter.frequencyHz];
}

/** Power of an emitter behind `gainAt`, mW, when it is on: a pulse's peak, anything else's mean. */
function onPowerMw(emitter: Emitter, gainAt: (frequencyHz: number) => number): number {
	const kind = kindOf(emitter);
	const powerMw = emitter.kind === 'pulsed' ? kind.peakPowerMw(emitter) : kind.meanPowerMw(emitter);
	const gains = placesHz(emitter).map(gainAt);
	if (emitter.kind === 'noise') return (powerMw * gains.reduce((a, b) => a + b, 0)) / gains.length;
	return powerMw * Math.max(...gains);
}

/** Total power at the connector, mW: everything on at once, pulses at their peaks. */
export const connectorPowerMw = (scene: Scene, gainAt: (frequencyHz: number) => number): number =>
	scene.emitters.reduce((total, emitter) => total + onPowerMw(emitter, gainAt), 0);

/** Whether a total at the mixer is within 3 dB of 1 dB compression. */
export const isOverload = (mixerDbm: number, profile: ReceiverProfile): boolean =>
	profile.toiDbm !== null && mixerDbm > profile.toiDbm - COMPRESSION_UNDER_TOI_DB - OVERLOAD_MARGIN_DB;

/**
 * What would trip the input protection: more than the profile's safe power at the connector, or a direct voltage there
 * above 50 mV without a block. The attenuator is behind the connector; neither it nor the preamplifier enters.
 */
export function inputProtection(
	scene: Scene,
	settings: FrontEndSettings,
	profile: ReceiverProfile,
	connectorMw: number
): Incident['protection'] {
	const volts = scene.emitters.reduce((sum, emitter) => sum + (emitter.kind === 'dc' ? emitter.volts : 0), 0);
	if (!settings.input.dcBlock && Math.abs(volts) > SAFE_DC_VOLTS) {
		return { reason: 'dc', connectorDbm: voltsToDbm(Math.abs(volts)), limitDbm: voltsToDbm(SAFE_DC_VOLTS) };
	}
	const connectorDbm = milliwattsToDbm(connectorMw);
	if (connectorDbm > profile.maxSafeInputDbm) {
		return { reason: 'power', connectorDbm, limitDbm: profile.maxSafeInputDbm };
	}
	return undefined;
}
