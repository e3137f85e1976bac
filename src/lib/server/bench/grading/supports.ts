/** Whether a reading can carry an answer: of what is asked, where it is asked, done finely enough for the tolerance. */
import type { BenchRequest } from '$lib/schemas/reading';
import type { NumberQuestion } from '../exercise/drawn-exercise';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import { asksPlace } from './asked';
import type { Source } from './evidence';
import { familyOf } from './family';
import { takenAtHz, trueHz } from './place';
import { sameWidth, widthHzOf } from './read-width';

type Check = (source: Source, question: NumberQuestion) => boolean;
type Fields = Record<string, number | undefined>;

/** Distance between two points of the trace. */
const stepHz = ({ setUp: { resolved } }: Source): number => resolved.spanHz / (resolved.points - 1);
/** How near to a line a marker must stand to be on it. */
export const onLineHz = (source: Source): number =>
	Math.max(source.setUp.resolved.rbwHz, 1.5 * stepHz(source));
const near = (a: number | undefined, b: number | undefined, withinHz: number): boolean =>
	a === undefined || b === undefined || Math.abs(a - b) <= withinHz;
const fieldsOf = (asked: object): Fields => asked as Fields;

/** A marker stands on the line; farther away it is on something else, or on nothing. Lines may move by the tolerance. */
const onLine: Check = (source, { frequencyHz }) =>
	frequencyHz === 0 || near(takenAtHz(source), frequencyHz, onLineHz(source));

/** Three standard deviations of a count, or a point of a trace, within what is right. */
const fineEnough: Check = (source, { tolerance }) =>
	source.family === 'count' ? 3 * source.reading.spread <= tolerance : stepHz(source) <= tolerance;

const showsPlace: Check = (source, question) =>
	(source.family === 'count' || source.family === 'point') &&
	fineEnough(source, question) &&
	near(takenAtHz(source), question.frequencyHz, Math.max(onLineHz(source), question.tolerance));

const band: Check = ({ request }, { quantity, frequencyHz }) => {
	const [width, wanted] = [widthHzOf(request), widthHzOf(quantity)];
	if (width === undefined || wanted === undefined) return false;
	return (
		sameWidth(width, wanted) && near(quantityFrequencyHz(request) || frequencyHz, frequencyHz, 0.05 * wanted)
	);
};

const density: Check = ({ request }, { quantity, frequencyHz }) => {
	const wanted = widthHzOf(quantity);
	if (wanted === undefined) return true;
	const atHz = quantityFrequencyHz(request) || frequencyHz;
	return (widthHzOf(request) ?? 0) < 1.5 * wanted && near(atHz, frequencyHz, 0.5 * wanted);
};

const delta: Check = (source, question) => {
	const [read, asked] = [fieldsOf(source.request), fieldsOf(question.quantity)];
	const [low, high] = [read.fromHz, read.toHz].map((hz) => trueHz(source, hz)).sort((a = 0, b = 0) => a - b);
	const [wantedLow, wantedHigh] = [asked.fromHz, asked.toHz].sort((a = 0, b = 0) => a - b);
	if (low === undefined || high === undefined) return question.unit === 's';
	const within = onLineHz(source);
	const fine = question.unit !== 'Hz' || stepHz(source) <= question.tolerance;
	return fine && near(low, wantedLow, within) && near(high, wantedHigh, within);
};

/** A bandwidth's window, or the whole trace where there is none, holds what is asked and its middle. */
const bandwidth: Check = (source, { quantity, frequencyHz, unit, truth }) => {
	const [read, asked] = [fieldsOf(source.request), fieldsOf(quantity)];
	const { spanHz, centreHz } = source.setUp.resolved;
	const widthHz = read.widthHz ?? spanHz;
	const reachHz = Math.max(0, (widthHz - (unit === 'Hz' && truth < spanHz ? truth : 0)) / 2);
	return (
		samely(read.percent, asked.percent) &&
		samely(read.db, asked.db) &&
		(frequencyHz === 0 || near(read.centreHz ?? centreHz, frequencyHz, reachHz))
	);
};

const samely = (a: number | undefined, b: number | undefined): boolean =>
	a === b || (a !== undefined && b !== undefined && Math.abs(a / b - 1) < 0.01);

const adjacent: Check = ({ request }, { quantity, part }) => {
	if (request.kind !== 'adjacent-channel' || quantity.kind !== 'adjacent-channel') return false;
	if (!sameWidth(request.widthHz, quantity.widthHz) || !samely(request.rrcRollOff, quantity.rrcRollOff))
		return false;
	const wanted =
		part !== undefined && typeof part !== 'string' && 'offsetHz' in part
			? quantity.offsets.filter(({ offsetHz }) => samely(offsetHz, part.offsetHz))
			: quantity.offsets;
	const read = request.offsets;
	return (
		near(request.centreHz, quantity.centreHz, 0.05 * quantity.widthHz) &&
		wanted.every((one) =>
			read.some(({ offsetHz, widthHz }) => samely(offsetHz, one.offsetHz) && sameWidth(widthHz, one.widthHz))
		) &&
		(part !== undefined || read.length === wanted.length)
	);
};

/** Carrier to noise: the same carrier and width, the noise taken clear of the carrier. */
const carrierToNoise: Check = (source, { quantity }) => {
	const [read, asked] = [fieldsOf(source.request), fieldsOf(quantity)];
	const clearHz = Math.abs((read.noiseHz ?? 0) - (asked.carrierHz ?? 0));
	return (
		sameWidth(read.widthHz ?? 0, asked.widthHz ?? 0) &&
		near(read.carrierHz, asked.carrierHz, Math.max(onLineHz(source), 0.05 * (asked.widthHz ?? 0))) &&
		clearHz > (asked.widthHz ?? 0) / 2
	);
};

/** Phase noise at the same offset of the same carrier, on either side. */
const phaseNoise: Check = (source, { quantity }) => {
	const [read, asked] = [fieldsOf(source.request), fieldsOf(quantity)];
	const offsets = [read.offsetHz, asked.offsetHz].map((offset) => Math.abs(offset ?? 0));
	return sameWidth(offsets[0], offsets[1]) && near(read.carrierHz, asked.carrierHz, onLineHz(source));
};

const intercept: Check = (source, { quantity }) => {
	const [read, asked] = [fieldsOf(source.request), fieldsOf(quantity)];
	const within = onLineHz(source);
	return near(read.lowerHz, asked.lowerHz, within) && near(read.upperHz, asked.upperHz, within);
};

const CHECKS: Partial<Record<BenchRequest['kind'] | 'point' | 'band' | 'density', Check>> = {
	point: onLine,
	band,
	density,
	delta,
	'occupied-bandwidth': bandwidth,
	'x-db-bandwidth': bandwidth,
	'adjacent-channel': adjacent,
	'carrier-to-noise': carrierToNoise,
	'phase-noise': phaseNoise,
	intercept
};

const isWidth = (family: string): boolean => family === 'occupied-bandwidth' || family === 'x-db-bandwidth';

/** Whether a reading is of what the question asks: the same quantity, at the same place, over the same width, as finely as asked. */
export function supports(source: Source, question: NumberQuestion): boolean {
	const asked = familyOf(question.quantity.kind);
	if (asked !== 'count' && asked !== 'point' && source.family !== asked) return false;
	// An edge of a bandwidth is a place that its own reading gives.
	if (asksPlace(question) && (source.family !== asked || !isWidth(asked)))
		return showsPlace(source, question);
	if (source.family !== asked) return false;
	return (CHECKS[asked] ?? onLine)(source, question);
}
