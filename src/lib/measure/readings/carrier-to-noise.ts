/** Carrier power over noise power in a width, dB. */
import { dbmToMilliwatts, milliwattsToDbm, powerRatioToDb } from '$lib/units/decibel';
import { bandPower, channelOf } from '../band';
import { findLine } from '../find-line';
import { lineSpreadDb } from '../line-spectrum';
import { noiseDensityAt } from '../noise-density';
import { isNoNumber, needsSpan, noNumber, type NoNumber, outsideTrace, type Reader } from '../reader';
import type { Remark } from '../remark';
import { once, unresolvedLineRemarks } from '../remarks';
import { NOISE_PER_RBW } from '../resolution-filter';
import { covers, isZeroSpan, type Trace } from '../trace';

export const carrierToNoise: Reader<'carrier-to-noise'> = (trace, { carrierHz, widthHz, noiseHz }) => {
	if (isZeroSpan(trace)) return needsSpan();
	if (!covers(trace, carrierHz)) return outsideTrace('The carrier');
	const density = noiseDensityAt(trace, noiseHz);
	if (isNoNumber(density)) return density;
	const carrier = carrierPower(trace, carrierHz, widthHz, density.shownDbm);
	if (isNoNumber(carrier)) return carrier;
	const noiseDbm = density.dbmPerHz + powerRatioToDb(widthHz);
	return {
		value: carrier.levelDbm - noiseDbm,
		unit: 'dB',
		spread: Math.hypot(carrier.spreadDb, density.spreadDb),
		remarks: once([...carrier.remarks, ...density.remarks]),
		parts: { carrierDbm: carrier.levelDbm, noiseDbm }
	};
};

interface CarrierPower {
	levelDbm: number;
	spreadDb: number;
	remarks: Remark[];
}

/**
 * The carrier without the noise it stands in: all the power in the width, or, when the filter is not much narrower than that,
 * the top of the line.
 * @param shownNoiseDbm power that the trace shows where there is noise alone, in one resolution bandwidth
 */
function carrierPower(
	trace: Trace,
	carrierHz: number,
	widthHz: number,
	shownNoiseDbm: number
): CarrierPower | NoNumber {
	if (widthHz < 3 * trace.rbwHz) {
		const line = findLine(trace, carrierHz, 2 * trace.rbwHz);
		const spreadDb = lineSpreadDb(trace, line.levelDbm, shownNoiseDbm);
		return withoutNoise(
			{ levelDbm: line.levelDbm, spreadDb, remarks: unresolvedLineRemarks(trace) },
			shownNoiseDbm
		);
	}
	const band = bandPower(trace, ...channelOf(carrierHz, widthHz));
	if (isNoNumber(band)) return band;
	return withoutNoise(band, shownNoiseDbm + powerRatioToDb(widthHz / (NOISE_PER_RBW * trace.rbwHz)));
}

function withoutNoise(
	{ levelDbm, spreadDb, remarks }: CarrierPower,
	noiseDbm: number
): CarrierPower | NoNumber {
	const carrierMw = dbmToMilliwatts(levelDbm) - dbmToMilliwatts(noiseDbm);
	if (!(carrierMw > 0))
		return noNumber('No carrier stands out of the noise.', 'a narrower resolution bandwidth');
	const carrierDbm = milliwattsToDbm(carrierMw);
	// What is left strays as much in mW as what it was taken from, and so by more dB.
	return { levelDbm: carrierDbm, spreadDb: spreadDb * dbmToMilliwatts(levelDbm - carrierDbm), remarks };
}
