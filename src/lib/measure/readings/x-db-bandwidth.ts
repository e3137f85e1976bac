/** The width between the outermost points where the trace lies x dB under its highest. */
import { highestPoint } from '../find-peaks';
import { levelSpreadDb } from '../line-level';
import { isNoiseLike, noiseShare } from '../noise-share';
import { pointSpreadDb } from '../noise-statistics';
import { needsSpan, noNumber, type Reader } from '../reader';
import { type Remark, remark } from '../remark';
import { noiseRemarks } from '../remarks';
import { filterWidthHz } from '../resolution-filter';
import { frequencyAt, isZeroSpan, stepHz, type Trace } from '../trace';

export const xDbBandwidth: Reader<'x-db-bandwidth'> = (trace, { db }) => {
	if (isZeroSpan(trace)) return needsSpan();
	const levels = trace.levelsDbm;
	const top = highestPoint(levels);
	const limitDbm = levels[top] - db;
	const last = levels.length - 1;
	let lower = 0;
	while (levels[lower] < limitDbm) lower++;
	let upper = last;
	while (levels[upper] < limitDbm) upper--;
	if (lower === 0 || upper === last) {
		return noNumber(
			`The trace does not fall ${db} dB on both sides of its highest point.`,
			'a wider span or less noise'
		);
	}
	const lowerAt = crossing(levels, lower - 1, limitDbm);
	const upperAt = crossing(levels, upper, limitDbm);
	const share = noiseShare(trace, Math.max(0, lower - 1), Math.min(last, upper + 1));
	const value = (upperAt - lowerAt) * stepHz(trace);
	const crossingDb = Math.hypot(share * pointSpreadDb(trace), levelSpreadDb(trace, top));
	return {
		value,
		unit: 'Hz',
		spread: Math.min(
			value,
			Math.hypot(crossingDb / slope(trace, lower - 1), crossingDb / slope(trace, upper))
		),
		remarks: widthRemarks(trace, value, db, share),
		parts: { lowerHz: frequencyAt(trace, lowerAt), upperHz: frequencyAt(trace, upperAt) }
	};
};

/** Where the trace passes a level between two points, in points. */
function crossing(levels: ArrayLike<number>, index: number, levelDbm: number): number {
	const [a, b] = [levels[index], levels[index + 1]];
	return index + (levelDbm - a) / (b - a);
}

/** Steepness around a crossing, dB/Hz: over half a resolution bandwidth on either side, since two points may differ by chance. */
function slope(trace: Trace, index: number): number {
	const levels = trace.levelsDbm;
	const reach = Math.max(1, Math.round(trace.rbwHz / stepHz(trace) / 2));
	const from = Math.max(0, index - reach + 1);
	const to = Math.min(levels.length - 1, index + reach);
	const fallDb = Math.max(0.1, Math.abs(levels[to] - levels[from]));
	return fallDb / ((to - from) * stepHz(trace));
}

function widthRemarks(trace: Trace, widthHz: number, db: number, share: number): Remark[] {
	const found = isNoiseLike(share) ? noiseRemarks(trace) : [];
	const ownHz = filterWidthHz(db, trace.rbwHz);
	if (widthHz < 3 * ownHz) {
		const percent = Math.min(100, (100 * ownHz) / widthHz).toFixed(0);
		found.push(remark('rbw-too-wide', `The resolution filter alone is ${percent} % as wide at ${db} dB.`));
	}
	return found;
}
