/** The receiver's own noise, referred to the connector. */
import type { NoiseFigureTable, ReceiverProfile } from '$lib/schemas/receiver';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { dbToPowerRatio } from '$lib/units/decibel';
import { BOLTZMANN, STANDARD_KELVIN } from '$lib/units/thermal-noise';
import { tableDb } from '../table-db';

/** k·T₀ at 290 K, mW/Hz. */
export const THERMAL_MW_PER_HZ = BOLTZMANN * STANDARD_KELVIN * 1e3;

/** One stage of a chain: power gain and noise factor at 290 K, both linear. */
export interface Stage {
	gain: number;
	noiseFactor: number;
}

/**
 * Noise factor of stages in a row, linear: F = F₁ + (F₂ − 1)/G₁ + (F₃ − 1)/(G₁G₂) + … (Friis, Proc. IRE 32, 419, 1944).
 * @param stages in the order the signal meets them; at least one
 */
export function cascadeNoiseFactor(stages: readonly Stage[]): number {
	let factor = 1;
	let gain = 1;
	for (const stage of stages) {
		factor += (stage.noiseFactor - 1) / gain;
		gain *= stage.gain;
	}
	return factor;
}

/** A loss at 290 K: its noise factor is its loss. */
export const lossStage = (lossDb: number): Stage => ({
	gain: dbToPowerRatio(-lossDb),
	noiseFactor: dbToPowerRatio(lossDb)
});

const noiseFactorAt = (table: NoiseFigureTable, frequencyHz: number) =>
	dbToPowerRatio(tableDb(table, frequencyHz));

/**
 * Noise density of the receiver against frequency, referred to its connector, mW/Hz:
 * attenuator (a loss at 290 K), preamplifier when on, then the rest with the profile's noise figure.
 * 10 dB of attenuation raise it by 10 dB.
 */
export function floorDensity(
	profile: ReceiverProfile,
	settings: Pick<ResolvedSettings, 'attenuationDb' | 'preamp'>
): (frequencyHz: number) => number {
	const attenuator = lossStage(settings.attenuationDb);
	const preamp = settings.preamp ? profile.preamp : null;
	const amplifier: Stage = { gain: preamp ? dbToPowerRatio(preamp.gainDb) : 1, noiseFactor: 1 };
	const rest: Stage = { gain: 1, noiseFactor: 1 };
	// One list for all frequencies: this is asked thousands of times for a sweep.
	const stages = preamp ? [attenuator, amplifier, rest] : [attenuator, rest];
	return (frequencyHz) => {
		if (preamp) amplifier.noiseFactor = noiseFactorAt(preamp.noiseFigureDb, frequencyHz);
		rest.noiseFactor = noiseFactorAt(profile.noiseFigureDb, frequencyHz);
		return THERMAL_MW_PER_HZ * cascadeNoiseFactor(stages);
	};
}
