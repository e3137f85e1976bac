/** Width and repetition of pulses, from their spectrum or, in span 0, over time; the value is the width. */
import { envelopeOf, median, onTimesS, periodsS } from '../envelope';
import { envelopeProblem, timeRemarks, timeSpreadS } from '../envelope-times';
import { pulseSpectrum } from '../pulse-spectrum';
import type { Outcome, Reader } from '../reader';
import { isZeroSpan, type Trace } from '../trace';

export const pulse: Reader<'pulse'> = (trace, { carrierHz }) =>
	isZeroSpan(trace) ? pulseOverTime(trace) : pulseSpectrum(trace, carrierHz);

function pulseOverTime(trace: Trace): Outcome<'pulse'> {
	const envelope = envelopeOf(trace);
	const problem = envelopeProblem(trace, envelope);
	if (problem) return problem;
	const widthS = median(onTimesS(envelope));
	const periods = periodsS(envelope);
	return {
		value: widthS,
		unit: 's',
		spread: timeSpreadS(trace, envelope),
		remarks: timeRemarks(trace, envelope, widthS),
		parts: { widthS, repetitionHz: periods.length > 0 ? 1 / median(periods) : undefined }
	};
}
