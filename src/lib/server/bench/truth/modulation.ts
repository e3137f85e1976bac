/** What an emitter is made of, as its modulation shows it. */
import { powerRatioToDb } from '$lib/units/decibel';
import type { Emitter, EmitterOf } from '$lib/schemas/scene';
import { BenchError } from '../bench-error';
import { phaseNoiseAt } from '../signal/phase-noise';
import type { PlacedEmitter } from './place-emitters';
import { lineAt } from './spectrum';
import type { TruthOf } from './truth-kind';

type Carrier = EmitterOf<'cw' | 'am' | 'fm' | 'pm' | 'pulsed'>;

/** The emitter of one of these kinds nearest to `carrierHz`. @throws BenchError naming carrierHz */
function nearest<K extends Carrier['kind']>(
	emitters: PlacedEmitter[],
	kinds: K[],
	carrierHz: number
): EmitterOf<K> {
	const isOne = (emitter: Emitter): emitter is Carrier => (kinds as Emitter['kind'][]).includes(emitter.kind);
	const distance = (emitter: Carrier) => Math.abs(emitter.frequencyHz - carrierHz);
	const found = emitters
		.map(({ emitter }) => emitter)
		.filter(isOne)
		.sort((a, b) => distance(a) - distance(b))[0];
	if (found) return found as EmitterOf<K>;
	throw new BenchError('carrierHz', `carrierHz: the scene has no emitter of kind ${kinds.join(' or ')}`);
}

/** Depth of amplitude modulation, %: both sidebands' amplitude over the carrier's, behind the device if there is one. */
export const amDepth: TruthOf<'am-depth'> = ({ emitters, spectrum }, { carrierHz }) => {
	const { frequencyHz, modulatingHz } = nearest(emitters, ['am'], carrierHz);
	const amplitude = (atHz: number) => Math.sqrt(lineAt(spectrum(), atHz)?.powerMw ?? 0);
	const sidebands = amplitude(frequencyHz - modulatingHz) + amplitude(frequencyHz + modulatingHz);
	return { value: (100 * sidebands) / amplitude(frequencyHz), unit: '%', parts: { modulatingHz } };
};

/** Peak frequency deviation, Hz; of phase modulation, its deviation times the modulating frequency. */
export const fmDeviation: TruthOf<'fm-deviation'> = ({ emitters }, { carrierHz }) => {
	const emitter = nearest(emitters, ['fm', 'pm'], carrierHz);
	const { modulatingHz } = emitter;
	const value = emitter.kind === 'fm' ? emitter.deviationHz : emitter.deviationRad * modulatingHz;
	return { value, unit: 'Hz', parts: { modulatingHz, index: value / modulatingHz } };
};

/** Single-sideband phase noise of the carrier at an offset of either sign, dBc/Hz. */
export const phaseNoise: TruthOf<'phase-noise'> = ({ emitters }, { carrierHz, offsetHz }) => {
	const { phaseNoise: points, frequencyHz, levelDbm } = nearest(emitters, ['cw'], carrierHz);
	const density = points ? phaseNoiseAt(points, Math.abs(offsetHz)) : 0;
	if (!(density > 0))
		throw new BenchError(
			'offsetHz',
			`offsetHz: the carrier has no phase noise ${Math.abs(offsetHz)} Hz away`
		);
	return {
		value: powerRatioToDb(density),
		unit: 'dBc/Hz',
		parts: { carrierDbm: levelDbm, carrierHz: frequencyHz }
	};
};

/** Width of a pulse, s. */
export const pulse: TruthOf<'pulse'> = ({ emitters }, { carrierHz }) => {
	const { widthS, periodS } = nearest(emitters, ['pulsed'], carrierHz);
	return { value: widthS, unit: 's', parts: { widthS, repetitionHz: 1 / periodS } };
};

/** Level during a pulse, dBm: what its mean power would be if it stayed on. */
export const pulseLevel: TruthOf<'pulse-level'> = ({ emitters }, { carrierHz }) => ({
	value: nearest(emitters, ['pulsed'], carrierHz).levelDbm,
	unit: 'dBm'
});

/** How long what comes and goes stays, s: a gate's on time, a dwell, a pulse. */
export const time: TruthOf<'time'> = ({ emitters }) => {
	for (const { emitter } of emitters) {
		if (emitter.kind === 'noise' || emitter.kind === 'dc') continue;
		const edges = { riseS: 0, fallS: 0 };
		if (emitter.gate) {
			const { onS, offS } = emitter.gate;
			return { value: onS, unit: 's', parts: { onS, ...edges, periodS: onS + offS } };
		}
		if (emitter.hop)
			return { value: emitter.hop.dwellS, unit: 's', parts: { onS: emitter.hop.dwellS, ...edges } };
		if (emitter.kind === 'pulsed')
			return {
				value: emitter.widthS,
				unit: 's',
				parts: { onS: emitter.widthS, ...edges, periodS: emitter.periodS }
			};
	}
	throw new BenchError('kind', 'kind: nothing in the scene comes and goes');
};

/** The device's own third-order intercept, dBm. */
export const intercept: TruthOf<'intercept'> = ({ scene }) => {
	const toiDbm = scene.device?.toiDbm ?? null;
	if (toiDbm === null) throw new BenchError('kind', 'kind: the scene has no device with an intercept');
	return { value: toiDbm, unit: 'dBm', parts: { lowerDbm: toiDbm, upperDbm: toiDbm } };
};
