/** What stands at the mixer, and what the mixer makes of a carrier when it is too much. */
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { dbmToMilliwatts, milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { connectionGain } from '../receiver/front-end/connection';
import { connectorPowerMw, isOverload } from '../receiver/front-end/input-level';
import type { Context } from './mistake';

/** A scene and the receiver before it. */
interface Bench {
	drawn: Pick<Context['drawn'], 'scene' | 'profile'>;
}

/** From connector to mixer, dB. */
export const mixerGainDb = ({ attenuationDb, preamp }: ResolvedSettings, profile: ReceiverProfile): number =>
	(preamp && profile.preamp ? profile.preamp.gainDb : 0) - attenuationDb;

/** Total power of the scene at the mixer, dBm. */
export const mixerLevelDbm = ({ drawn }: Bench, resolved: ResolvedSettings): number =>
	milliwattsToDbm(connectorPowerMw(drawn.scene, connectionGain(drawn.scene, resolved).at)) +
	mixerGainDb(resolved, drawn.profile);

/** Whether the receiver warns of overload. */
export const overloads = (context: Bench, resolved: ResolvedSettings): boolean =>
	resolved.input.connected && isOverload(mixerLevelDbm(context, resolved), context.drawn.profile);

/**
 * What the carrier asked for loses in the mixer, dB, negative: of y = x − x|x|²/P_toi on the envelope, a line of power P
 * among a total T keeps 1 − (P + 2(T − P))/P_toi, the input held at T = P_toi/3 beyond that (bench.md §4; `signal/nonlinearity.ts`).
 */
export function mixerChangeDb(context: Context, resolved: ResolvedSettings): number {
	const { drawn, question } = context;
	if (drawn.profile.toiDbm === null) return 0;
	const toiMw = dbmToMilliwatts(drawn.profile.toiDbm);
	const totalMw = dbmToMilliwatts(mixerLevelDbm(context, resolved));
	const arrivesDbm = question.truth - question.leadDb - resolved.input.padDb;
	const ownMw = dbmToMilliwatts(arrivesDbm + mixerGainDb(resolved, drawn.profile));
	const share = Math.min(1, toiMw / (3 * totalMw));
	const kept = 1 - ((2 * totalMw - ownMw) * share) / toiMw;
	return powerRatioToDb(share) + 2 * powerRatioToDb(kept);
}
