/** What readings of times in span 0 share: whether there are any, how sure they are, and what spoils them. */
import { type Envelope, median, onTimesS, periodsS } from './envelope';
import { pointTimeS, videoBandwidthHz } from './noise-statistics';
import { noNumber, type NoNumber } from './reader';
import { type Remark, remark } from './remark';
import { isZeroSpan, type Trace } from './trace';

/** Why an envelope holds no on time. */
export function envelopeProblem(trace: Trace, envelope: Envelope): NoNumber | null {
	if (!isZeroSpan(trace))
		return noNumber('The trace runs over frequency.', 'span 0, where it runs over time');
	if (onTimesS(envelope).length > 0) return null;
	return noNumber(
		'The level does not rise and fall again within the sweep.',
		'a longer sweep time, or one that starts earlier'
	);
}

/**
 * One standard deviation of the median on time: each edge falls somewhere between two points, and scatter of the level moves it by
 * scatter over slope (80 % of the step in the edge's own duration).
 */
export function timeSpreadS(trace: Trace, envelope: Envelope): number {
	const durations = envelope.edges.flatMap(({ durationS }) => durationS ?? []);
	const edgeS = durations.length > 0 ? median(durations) : pointTimeS(trace);
	const noiseS = Math.min(edgeS, (edgeS / 0.8) * (envelope.scatter / (envelope.high - envelope.low)));
	return Math.hypot(pointTimeS(trace) / Math.sqrt(12), noiseS) * Math.sqrt(2 / onTimesS(envelope).length);
}

export function timeRemarks(trace: Trace, envelope: Envelope, onS: number): Remark[] {
	const found: Remark[] = [];
	// A burst through the filter reaches its full level, within 0.1 dB, when it lasts 1.5/B.
	if (onS < 1.5 / trace.rbwHz) {
		found.push(
			remark('rbw-too-narrow', 'The burst is too short for this resolution bandwidth: it reads low and long.')
		);
	}
	if (onS < 1 / videoBandwidthHz(trace)) {
		found.push(
			remark('vbw-too-narrow', 'The burst is too short for this video bandwidth: it reads low and long.')
		);
	}
	if (onS < 5 * pointTimeS(trace)) {
		found.push(remark('too-few-points', 'The burst is only a few points long.'));
	}
	if (envelope.high < 2 * envelope.low) {
		found.push(remark('near-noise', 'High and low level lie less than 6 dB apart: the edges may be chance.'));
	}
	if (periodsS(envelope).length === 0) {
		found.push(remark('no-repetition', 'The sweep holds one burst only: no period can be read.'));
	}
	return found;
}
