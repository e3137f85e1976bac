import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { Settings } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';
import { tableDb } from './table-db';

/** Automatic attenuation lets a signal at the reference level reach the mixer at this level at most. */
const MIXER_LIMIT_DBM = -10;
/** Rounding of the sum, dB: a level that is −10 dBm on paper needs no further step. */
const ROUNDING_DB = 1e-9;

/**
 * The attenuator's step, dB: the one stated, or the smallest with
 * referenceDbm − correction − attenuation + gain ≤ −10 dBm, the correction taken at the centre frequency.
 * A pad before the connector doesn't enter: the receiver can't know of it.
 * @throws BenchError when the stated value is no step, or when no step is enough
 */
export function resolveAttenuation(settings: Settings, profile: ReceiverProfile, centreHz: number): number {
	const { attenuationDb = 'auto', referenceDbm = 0, correctionDb = 0 } = settings;
	if (attenuationDb !== 'auto') {
		if (!profile.attenuatorDb.includes(attenuationDb)) {
			const steps = profile.attenuatorDb.join(', ');
			throw new BenchError(
				'attenuationDb',
				`must be one of ${steps} dB or "auto"; given ${attenuationDb} dB`
			);
		}
		return attenuationDb;
	}
	const correctionHereDb = typeof correctionDb === 'number' ? correctionDb : tableDb(correctionDb, centreHz);
	const gainDb = settings.preamp && profile.preamp ? profile.preamp.gainDb : 0;
	const steps = [...profile.attenuatorDb].sort((a, b) => a - b);
	const enough = steps.find(
		(step) => referenceDbm - correctionHereDb - step + gainDb <= MIXER_LIMIT_DBM + ROUNDING_DB
	);
	if (enough === undefined) {
		const field =
			settings.referenceDbm === undefined && settings.correctionDb !== undefined
				? 'correctionDb'
				: 'referenceDbm';
		throw new BenchError(
			field,
			`reference ${referenceDbm} dBm less correction ${correctionHereDb} dB plus gain ${gainDb} dB is more than automatic ` +
				`attenuation can bring to ${MIXER_LIMIT_DBM} dBm at the mixer: its largest step is ${steps[steps.length - 1]} dB; ` +
				'lower it or state attenuationDb'
		);
	}
	return enough;
}
