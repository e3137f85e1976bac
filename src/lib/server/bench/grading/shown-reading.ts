/** What a reading gives on the mean trace of a set-up, and how far noise lets it stray there. */
import { channelOf } from '$lib/measure/band';
import { stretchOf, wholeStretch } from '$lib/measure/cells';
import { cumulativeOf, edgeAtShare } from '$lib/measure/cumulative';
import { isProblem } from '$lib/measure/reading';
import type { ReadingRequest, RequestOf } from '$lib/measure/reading-request';
import { takeReading } from '$lib/measure/take-reading';
import type { Trace } from '$lib/measure/trace';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import { givenBy } from './asked';
import { displayedHz } from './displayed';
import type { Context, Prediction, SetUp } from './mistake';
import { onTrueScale } from './move-request';
import { bandSpreadDb, pointSpreadDb } from './noise-law';
import { shownTrace } from './shown-trace';
import { modelSpread } from './spreads';

/**
 * What `request`, its places as this receiver displays them, gives to the question on the mean trace of a set-up; null where the
 * trace has no such number.
 */
export function shownReading(
	{ drawn, question }: Context,
	{ resolved }: SetUp,
	request: ReadingRequest,
	profile: ReceiverProfile = drawn.profile
): number | null {
	const truly = onTrueScale(request, displayedHz({ drawn }, 1));
	const reading = takeReading(shownTrace(drawn, profile, resolved), truly);
	return isProblem(reading) ? null : givenBy(reading, question);
}

/** The same as a prediction, with what noise and patience leave open. */
export function shownPrediction(context: Context, setUp: SetUp, request: ReadingRequest): Prediction | null {
	const settled = settledRequest(setUp, request);
	const value = shownReading(context, setUp, settled);
	if (value === null) return null;
	const trace = shownTrace(context.drawn, context.drawn.profile, setUp.resolved);
	return { value, spread: Math.hypot(modelSpread(context.question), noiseSpread(trace, setUp, settled)) };
}

/** Standard deviations that the highest of some tens of noisy points stands over their mean, less what their noise widens. */
const HIGHEST = 1.2;

/** An x dB width counts from the highest point, and of noisy points the highest stands over their mean. */
function settledRequest(setUp: SetUp, request: ReadingRequest): ReadingRequest {
	if (request.kind !== 'x-db-bandwidth') return request;
	return { ...request, db: Math.max(request.db / 2, request.db - HIGHEST * pointSpreadDb(setUp)) };
}

function noiseSpread(trace: Trace, setUp: SetUp, request: ReadingRequest): number {
	switch (request.kind) {
		case 'channel-power':
			return bandSpreadDb(setUp, request.widthHz);
		case 'adjacent-channel': {
			const widths = [request.widthHz, ...request.offsets.map(({ widthHz }) => widthHz)];
			return Math.SQRT2 * bandSpreadDb(setUp, Math.min(...widths));
		}
		case 'occupied-bandwidth':
			return shareSpreadHz(trace, setUp, request);
		case 'x-db-bandwidth':
			return levelSpreadHz(trace, setUp, request);
		case 'delta':
			return Math.SQRT2 * pointSpreadDb(setUp);
		default:
			return pointSpreadDb(setUp);
	}
}

function shareSpreadHz(
	trace: Trace,
	{ sweeps, trace: { mode, count } }: SetUp,
	{ centreHz, widthHz, percent }: RequestOf<'occupied-bandwidth'>
): number {
	const rows = mode === 'average' ? Math.min(sweeps, count) : 1;
	const averaged: Trace = { ...trace, mode: 'average', count: Math.max(1, rows) };
	const window = centreHz !== undefined && widthHz !== undefined ? channelOf(centreHz, widthHz) : null;
	const stretch = (window && stretchOf(averaged, ...window)) ?? wholeStretch(averaged);
	const cumulative = cumulativeOf(averaged, stretch);
	const outside = (1 - percent / 100) / 2;
	const edges = [outside, 1 - outside].map((share) => edgeAtShare(averaged, cumulative, share).noiseSpreadHz);
	return Math.hypot(...edges);
}

/** Both crossings stray with their points, on a flank as steep as the mean trace has it. */
function levelSpreadHz(trace: Trace, setUp: SetUp, { db }: RequestOf<'x-db-bandwidth'>): number {
	const pointDb = pointSpreadDb(setUp);
	const widths = [Math.max(db / 2, db - pointDb), db + pointDb].map((downDb) =>
		takeReading(trace, { kind: 'x-db-bandwidth', db: downDb })
	);
	if (widths.some(isProblem)) return 0;
	const [narrow, wide] = widths.map((reading) => ('value' in reading ? reading.value : 0));
	return (wide - narrow) / 2;
}
