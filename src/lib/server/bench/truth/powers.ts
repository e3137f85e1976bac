/** Powers in a width, and densities. */
import { milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { BenchError } from '../bench-error';
import { densityAt, powerBetween, type Spectrum } from './spectrum';
import type { TruthOf } from './truth-kind';

/** Power between two frequencies in dBm; refuses, naming `field`, where there is none. */
function levelBetween(spectrum: Spectrum, startHz: number, stopHz: number, field: string): number {
	const powerMw = powerBetween(spectrum, startHz, stopHz);
	if (powerMw > 0) return milliwattsToDbm(powerMw);
	throw new BenchError(field, `${field}: there is no power between ${startHz} and ${stopHz} Hz`);
}

const channelLevel = (
	spectrum: Spectrum,
	{ centreHz, widthHz }: { centreHz: number; widthHz: number }
): number => levelBetween(spectrum, centreHz - widthHz / 2, centreHz + widthHz / 2, 'centreHz');

/** Power from `startHz` to `stopHz`, dBm. */
export const bandPower: TruthOf<'band-power'> = ({ spectrum }, { startHz, stopHz }) => ({
	value: levelBetween(spectrum(), startHz, stopHz, 'startHz'),
	unit: 'dBm'
});

/** Power in `widthHz` around `centreHz`, dBm. */
export const channelPower: TruthOf<'channel-power'> = ({ spectrum }, channel) => ({
	value: channelLevel(spectrum(), channel),
	unit: 'dBm'
});

/** Mean density in `widthHz` around `centreHz`, dBm/Hz. */
export const powerDensity: TruthOf<'power-density'> = ({ spectrum }, channel) => ({
	value: channelLevel(spectrum(), channel) - powerRatioToDb(channel.widthHz),
	unit: 'dBm/Hz'
});

/** Density of everything but lines at `atHz`, dBm/Hz. */
export const noiseDensity: TruthOf<'noise-density'> = ({ spectrum }, { atHz }) => ({
	value: milliwattsToDbm(densityOrRefuse(spectrum(), atHz, 'atHz')),
	unit: 'dBm/Hz'
});

function densityOrRefuse(spectrum: Spectrum, frequencyHz: number, field: string): number {
	const density = densityAt(spectrum, frequencyHz);
	if (density > 0) return density;
	throw new BenchError(field, `${field}: there is no noise at ${frequencyHz} Hz`);
}

/** Power in `widthHz` around the carrier, less the noise in it, over that noise; its density is taken at `noiseHz`. dB. */
export const carrierToNoise: TruthOf<'carrier-to-noise'> = (
	{ spectrum },
	{ carrierHz, widthHz, noiseHz }
) => {
	const noiseMw = densityOrRefuse(spectrum(), noiseHz, 'noiseHz') * widthHz;
	const carrierMw = powerBetween(spectrum(), carrierHz - widthHz / 2, carrierHz + widthHz / 2) - noiseMw;
	if (!(carrierMw > 0))
		throw new BenchError('carrierHz', `carrierHz: no carrier stands out of the noise there`);
	return {
		value: powerRatioToDb(carrierMw / noiseMw),
		unit: 'dB',
		parts: { carrierDbm: milliwattsToDbm(carrierMw), noiseDbm: milliwattsToDbm(noiseMw) }
	};
};
