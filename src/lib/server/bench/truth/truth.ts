/** The exact value of a quantity of a scene: what an answer is held against. */
import type { Quantity, QuantityKind } from '$lib/schemas/quantity';
import type { Scene } from '$lib/schemas/scene';
import { adjacentChannel } from './adjacent-channel';
import { harmonics, thd } from './harmonics';
import { count, delta, marker, nextPeak, peak } from './levels';
import { mask } from './mask';
import { amDepth, fmDeviation, intercept, phaseNoise, pulse, pulseLevel, time } from './modulation';
import { occupiedBandwidth } from './occupied-bandwidth';
import { placeEmitters } from './place-emitters';
import { bandPower, carrierToNoise, channelPower, noiseDensity, powerDensity } from './powers';
import { spectrumOf, type Spectrum } from './spectrum';
import type { Subject, TruthOf, TruthValue } from './truth-kind';
import { xDbBandwidth } from './x-db-bandwidth';

const kinds: { [K in QuantityKind]: TruthOf<K> } = {
	marker,
	delta,
	peak,
	'next-peak': nextPeak,
	count,
	'noise-density': noiseDensity,
	'band-power': bandPower,
	'channel-power': channelPower,
	'power-density': powerDensity,
	'occupied-bandwidth': occupiedBandwidth,
	'x-db-bandwidth': xDbBandwidth,
	'adjacent-channel': adjacentChannel,
	harmonics,
	thd,
	intercept,
	'carrier-to-noise': carrierToNoise,
	'phase-noise': phaseNoise,
	'am-depth': amDepth,
	'fm-deviation': fmDeviation,
	pulse,
	'pulse-level': pulseLevel,
	time,
	mask
};

export interface Truth extends TruthValue {
	kind: QuantityKind;
}

/**
 * A quantity of the scene at the reference plane: from the scene alone, without thermal noise or receiver, while on where
 * it comes and goes, integrals to 1e-6 of themselves. With `emitters` only those are there, the device included.
 * @returns value in base units (dBm, dBm/Hz, dB, dBc, dBc/Hz, Hz, s, %), and the parts that the reading of that kind has
 * @throws BenchError naming the field where the scene has no such thing
 */
export function truth(scene: Scene, quantity: Quantity): Truth {
	const emitters = placeEmitters(scene, quantity);
	let spectrum: Spectrum | undefined;
	const subject: Subject = {
		scene,
		emitters,
		spectrum: () => (spectrum ??= spectrumOf(emitters, scene.device))
	};
	const work = kinds[quantity.kind] as TruthOf<QuantityKind>;
	return { kind: quantity.kind, ...work(subject, quantity) };
}
