/** Times of a signal that comes and goes, in span 0, at half its voltage; the value is the on time. */
import { envelopeOf, median, onTimesS, periodsS } from '../envelope';
import { envelopeProblem, timeRemarks, timeSpreadS } from '../envelope-times';
import { type Reader } from '../reader';

export const time: Reader<'time'> = (trace) => {
	const envelope = envelopeOf(trace);
	const problem = envelopeProblem(trace, envelope);
	if (problem) return problem;
	const onS = median(onTimesS(envelope));
	const periods = periodsS(envelope);
	// The trace may begin or end within every edge of a kind: then it has no duration.
	const duration = (rising: boolean): number | undefined => {
		const whole = envelope.edges
			.filter((e) => e.rising === rising)
			.flatMap(({ durationS }) => durationS ?? []);
		return whole.length > 0 ? median(whole) : undefined;
	};
	return {
		value: onS,
		unit: 's',
		spread: timeSpreadS(trace, envelope),
		remarks: timeRemarks(trace, envelope, onS),
		parts: {
			onS,
			riseS: duration(true),
			fallS: duration(false),
			periodS: periods.length > 0 ? median(periods) : undefined
		}
	};
};
