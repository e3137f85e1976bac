/** The receiver's front end: from a scene to what reaches the resolution filter. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Scene } from '$lib/schemas/scene';
import { dbToPowerRatio, milliwattsToDbm } from '$lib/units/decibel';
import type { Incident } from '../incident';
import { chirpFactor } from '../resolution-filter';
import type { Seed } from '../random';
import { arrivalOf } from './arrival';
import { carriedFrom, type Carried } from './carried';
import { amplify, connect } from './connect';
import { connectionGain, type Connection } from './connection';
import { THERMAL_MW_PER_HZ } from './floor';
import type { FrontEndSettings } from './front-end-settings';
import { incidentEnvelopes } from './incident-envelopes';
import { incidentLines } from './incident-lines';
import { incidentNoises } from './incident-noises';
import { connectorPowerMw, inputProtection, isOverload } from './input-level';
import { ownLines } from './own-lines';
import { passStage } from './stage';
import { viewOf } from './view';

/** Products this far under k·T₀·B at the mixer are dropped, dB. */
const PRODUCT_UNDER_NOISE_DB = 20;
/** The device's are kept to this much less, since the mixer's may add to them. */
const DEVICE_MARGIN_DB = 20;
/** Lines farther than this from every tuned frequency, in B·√(1 + k²), are out of sight. */
const SIGHT_RBW = 40;

/**
 * What reaches the filter, referred to the connector (neither correction nor the receiver's errors are in it).
 * Chain: emitters → device → reference plane → path → pad → connector → attenuator → preamplifier → mixer.
 * Not connected, the input sees a matched load at 290 K, which the noise figure counts already.
 * @throws BenchError naming a phase noise too strong for small angles
 */
export function prepareIncident(
	scene: Scene,
	profile: ReceiverProfile,
	settings: FrontEndSettings,
	seed: Seed
): Incident {
	const connected: Scene = settings.input.connected ? scene : { emitters: [] };
	const view = viewOf(profile, settings);
	const connection = connectionGain(connected, settings);
	const atMixer = distorted(connected, profile, settings, connection, seed);
	const own = ownLines(profile, settings, view.receiver, seed);
	const { swept, arrived } = incidentLines(atMixer.lines, bandOf(profile, settings), view.receiver);
	const connectorMw = connectorPowerMw(connected, connection.at);
	const mixerDbm = milliwattsToDbm(connectorMw) + mixerGainDb(profile, settings);
	return {
		lines: [...swept, ...own.map(({ line }) => line)],
		noises: incidentNoises(atMixer.densities, [...arrived, ...own], view),
		envelopes: incidentEnvelopes(atMixer, view.receiver, seed),
		mixerDbm,
		overload: isOverload(mixerDbm, profile),
		protection: inputProtection(connected, settings, profile, connectorMw)
	};
}

/** From connector to mixer, dB. */
const mixerGainDb = (profile: ReceiverProfile, settings: FrontEndSettings): number =>
	(settings.preamp && profile.preamp ? profile.preamp.gainDb : 0) - settings.attenuationDb;

/** The scene behind device and mixer, referred back to the connector. */
function distorted(
	scene: Scene,
	profile: ReceiverProfile,
	settings: FrontEndSettings,
	connection: Connection,
	seed: Seed
): Carried {
	const emitted = carriedFrom(
		scene.emitters.map((emitter, index) => arrivalOf(emitter, index, settings.rbwHz, seed))
	);
	const gainDb = mixerGainDb(profile, settings);
	const floorDbm = milliwattsToDbm(THERMAL_MW_PER_HZ * settings.rbwHz) - PRODUCT_UNDER_NOISE_DB;
	const behindDevice = scene.device
		? passStage(emitted, { ...scene.device, floorDbm: floorDbm - gainDb - DEVICE_MARGIN_DB })
		: emitted;
	const atMixer = amplify(connect(behindDevice, connection), dbToPowerRatio(gainDb));
	const behindMixer = passStage(atMixer, { toiDbm: profile.toiDbm, shiDbm: profile.shiDbm, floorDbm });
	return amplify(behindMixer, dbToPowerRatio(-gainDb));
}

/** True frequencies that the sweep can see anything at, the receiver's reference error included. */
function bandOf(profile: ReceiverProfile, settings: FrontEndSettings) {
	const { startHz, stopHz, spanHz, rbwHz, sweepTimeS, points } = settings;
	const k = chirpFactor(rbwHz, spanHz / sweepTimeS);
	const sightHz =
		SIGHT_RBW * rbwHz * Math.sqrt(1 + k * k) + spanHz / (points - 1) + profile.referencePpm * 1e-6 * stopHz;
	return { startHz: startHz - sightHz, stopHz: stopHz + sightHz };
}
