/**
 * Third-order intercept of two tones: 2f₁−f₂ stands at 2P₁ + P₂ − 2·TOI, so TOI = (2P₁ + P₂ − P)/2, and likewise above
 * (Pozar, Microwave Engineering, §10.3). The value is the lower of the two.
 */
import { findLine, type SpectralLine } from '../find-line';
import { lineSpreadDb, noiseBetweenDbm } from '../line-spectrum';
import { needsSpan, noNumber, outsideTrace, type Reader } from '../reader';
import { type Remark, remark } from '../remark';
import { outsideRemark, unresolvedLineRemarks } from '../remarks';
import { covers, isZeroSpan, stepHz, type Trace } from '../trace';

export const intercept: Reader<'intercept'> = (trace, { lowerHz, upperHz }) => {
	if (isZeroSpan(trace)) return needsSpan();
	if (!covers(trace, lowerHz) || !covers(trace, upperHz)) return outsideTrace('One of the tones');
	const spacingHz = upperHz - lowerHz;
	const reachHz = Math.min(spacingHz / 3, Math.max(2 * trace.rbwHz, 2 * stepHz(trace)));
	const lower = findLine(trace, lowerHz, reachHz);
	const upper = findLine(trace, upperHz, reachHz);
	const noiseDbm = noiseBetweenDbm(trace);
	const sideOf = (near: SpectralLine, far: SpectralLine) => {
		const productHz = 2 * near.frequencyHz - far.frequencyHz;
		if (!covers(trace, productHz)) return undefined;
		const product = findLine(trace, productHz, Math.min(spacingHz / 3, Math.max(trace.rbwHz, stepHz(trace))));
		return {
			toiDbm: (2 * near.levelDbm + far.levelDbm - product.levelDbm) / 2,
			spreadDb: Math.hypot(
				lineSpreadDb(trace, near.levelDbm, noiseDbm),
				lineSpreadDb(trace, far.levelDbm, noiseDbm) / 2,
				lineSpreadDb(trace, product.levelDbm, noiseDbm) / 2
			),
			nearNoise: product.levelDbm < noiseDbm + 10
		};
	};
	const sides = { lower: sideOf(lower, upper), upper: sideOf(upper, lower) };
	const found = [sides.lower, sides.upper].filter((side) => side !== undefined);
	if (found.length === 0)
		return noNumber('Neither product lies on the trace.', 'a span of more than three times the spacing');
	const worst = found.reduce((a, b) => (b.toiDbm < a.toiDbm ? b : a));
	return {
		value: worst.toiDbm,
		unit: 'dBm',
		spread: worst.spreadDb,
		remarks: interceptRemarks(trace, spacingHz, found),
		parts: { lowerDbm: sides.lower?.toiDbm, upperDbm: sides.upper?.toiDbm }
	};
};

function interceptRemarks(trace: Trace, spacingHz: number, found: { nearNoise: boolean }[]): Remark[] {
	const remarks = unresolvedLineRemarks(trace);
	// Three B from a line the filter still lets −108 dB of it through, two B −48 dB.
	if (spacingHz < 3 * trace.rbwHz) {
		remarks.push(
			remark(
				'rbw-too-wide',
				'The tones lie less than three resolution bandwidths apart: their skirts cover the products.'
			)
		);
	}
	if (found.some(({ nearNoise }) => nearNoise)) {
		remarks.push(remark('near-noise', 'A product shows little but noise: the intercept is at least this.'));
	}
	if (found.length < 2) remarks.push(outsideRemark());
	return remarks;
}
