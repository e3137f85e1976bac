/** What the receiver's own oscillator and floor add to a carrier's skirts. */
import { dbToPowerRatio, dbmToMilliwatts, powerRatioToDb } from '$lib/units/decibel';
import { floorDensity } from '../receiver/front-end/floor';
import { phaseNoiseAt } from '../signal/phase-noise';
import { truth } from '../truth/truth';
import type { Context, SetUp } from './mistake';

/** Own noise against the carrier at the offset that a question asks for, 1/Hz; 0 where it asks for no phase noise. */
export function ownSkirtPerHz({ drawn, question }: Context, { resolved }: SetUp): number {
	const { quantity, leadDb } = question;
	if (quantity.kind !== 'phase-noise') return 0;
	const { profile, scene } = drawn;
	const own = profile.phaseNoise ? phaseNoiseAt(profile.phaseNoise, Math.abs(quantity.offsetHz)) : 0;
	const carrierDbm = truth(scene, { kind: 'marker', atHz: quantity.carrierHz }).value;
	const arrivesMw = dbmToMilliwatts(carrierDbm - leadDb - resolved.input.padDb);
	return own + floorDensity(profile, resolved)(quantity.carrierHz) / arrivesMw;
}

/** A reading of phase noise with the receiver's own share taken off as power, dBc/Hz; NaN where nothing is left. */
export function skirtTakenOff(context: Context, setUp: SetUp, readDbcPerHz: number): number {
	const left = dbToPowerRatio(readDbcPerHz) - ownSkirtPerHz(context, setUp);
	return left > 0 ? powerRatioToDb(left) : NaN;
}

/** By how much the receiver's own share lifts the phase noise asked for, dB. */
export const skirtUpDb = (context: Context, setUp: SetUp): number =>
	powerRatioToDb(1 + ownSkirtPerHz(context, setUp) / dbToPowerRatio(context.question.truth));
