/** Single-sideband phase noise: density at an offset over the carrier's power (IEEE Std 1139), dBc/Hz. */
import { findLine } from '../find-line';
import { lineSpreadDb } from '../line-spectrum';
import { noiseDensityAt } from '../noise-density';
import { isNoNumber, needsSpan, outsideTrace, type Reader } from '../reader';
import { remark } from '../remark';
import { unresolvedLineRemarks } from '../remarks';
import { filterLossDb } from '../resolution-filter';
import { covers, isZeroSpan, spanHz, stepHz } from '../trace';

export const phaseNoise: Reader<'phase-noise'> = (trace, { carrierHz, offsetHz }) => {
	if (isZeroSpan(trace)) return needsSpan();
	if (!covers(trace, carrierHz)) return outsideTrace('The carrier');
	const reachHz = Math.min(Math.abs(offsetHz) / 2, Math.max(2 * trace.rbwHz, 2 * stepHz(trace)));
	const carrier = findLine(trace, carrierHz, reachHz);
	// A tenth of the offset: over that a slope of 20 dB a decade averages out to 0.015 dB.
	const halfWidthHz = Math.min(0.025 * spanHz(trace), Math.abs(offsetHz) / 10);
	const density = noiseDensityAt(trace, carrier.frequencyHz + offsetHz, halfWidthHz);
	if (isNoNumber(density)) return density;
	const skirtDbm = carrier.levelDbm - filterLossDb(offsetHz, trace.rbwHz);
	const inSkirt = remark(
		'rbw-too-wide',
		'At this offset the resolution filter still shows the carrier itself.'
	);
	return {
		value: density.dbmPerHz - carrier.levelDbm,
		unit: 'dBc/Hz',
		spread: Math.hypot(density.spreadDb, lineSpreadDb(trace, carrier.levelDbm)),
		remarks: [
			...(skirtDbm > density.shownDbm - 15 ? [inSkirt] : []),
			...density.remarks,
			...unresolvedLineRemarks(trace)
		],
		parts: { carrierDbm: carrier.levelDbm, carrierHz: carrier.frequencyHz }
	};
};
