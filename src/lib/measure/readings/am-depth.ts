/** Depth of sinusoidal amplitude modulation, %: each sideband stands at 20·log10(m/2) from the carrier. */
import { dbToVoltageRatio } from '$lib/units/decibel';
import { envelopeDepth } from '../envelope-depth';
import { lineSpreadDb } from '../line-spectrum';
import { type ModulationLines, modulationLines } from '../modulation-lines';
import { isNoNumber, noNumber, type Outcome, type Reader } from '../reader';
import { type Remark, remark } from '../remark';
import { unresolvedLineRemarks } from '../remarks';
import { isZeroSpan, type Trace } from '../trace';

export const amDepth: Reader<'am-depth'> = (trace, { carrierHz }) => {
	if (isZeroSpan(trace)) return envelopeDepth(trace);
	const lines = modulationLines(trace, carrierHz);
	return isNoNumber(lines) ? lines : depthFromLines(trace, lines);
};

function depthFromLines(trace: Trace, lines: ModulationLines): Outcome<'am-depth'> {
	const carrier = lines.pairs[0]?.lower;
	const sidebands = [lines.pairs[1]?.lower, lines.pairs[1]?.upper].filter((line) => line !== undefined);
	if (!carrier || sidebands.length === 0) {
		return noNumber('The carrier or its sidebands lie outside the trace.', 'a wider span');
	}
	const ratios = sidebands.map(({ levelDbm }) => dbToVoltageRatio(levelDbm - carrier.levelDbm));
	const value = (200 * ratios.reduce((a, b) => a + b, 0)) / ratios.length;
	const sidebandDb =
		Math.hypot(...sidebands.map(({ levelDbm }) => lineSpreadDb(trace, levelDbm))) / sidebands.length;
	return {
		value,
		unit: '%',
		spread: value * (Math.LN10 / 20) * Math.hypot(sidebandDb, lineSpreadDb(trace, carrier.levelDbm)),
		remarks: [...unresolvedLineRemarks(trace), ...depthRemarks(lines)],
		parts: { modulatingHz: lines.modulatingHz }
	};
}

function depthRemarks({ pairs, lastFound }: ModulationLines): Remark[] {
	const found: Remark[] = [];
	const { lower, upper } = pairs[1];
	if (!lower || !upper) {
		found.push(remark('window-outside-span', 'Only one of the two sidebands lies on the trace.'));
	} else if (Math.abs(lower.levelDbm - upper.levelDbm) > 1) {
		found.push(remark('sidebands-unequal', 'The two sidebands differ: there is angle modulation as well.'));
	}
	if (lastFound >= 2) {
		found.push(
			remark(
				'second-pair',
				'A second pair of sidebands stands out: one tone of amplitude modulation has none.'
			)
		);
	}
	return found;
}
