/** What a question asks for: the value of its quantity, or one part of it. */
import { partOf, type Part } from '$lib/schemas/part';
import type { BenchReading } from '../exercise/attempt-record';
import type { NumberQuestion } from '../exercise/drawn-exercise';

const LEVELS = ['dBm', 'dBm/Hz'];
/** Whether a unit is an absolute level, which lead and correction shift. */
export const isAbsoluteLevel = (unit: string): boolean => LEVELS.includes(unit);

/** Parts that say where something stands, and not how far apart or how wide. */
const PLACES: Part[] = ['carrierHz', 'lowerHz', 'upperHz'];

type Asked = Pick<NumberQuestion, 'quantity' | 'part' | 'unit'>;

/** Whether a frequency is asked for: where a signal stands. */
export const asksPlace = ({ quantity, part }: Asked): boolean =>
	quantity.kind === 'count' ||
	(part === 'frequencyHz' && quantity.kind !== 'delta') ||
	(part !== undefined && PLACES.includes(part));

/**
 * The number that a reading gives to a question: the part asked for where the reading has it, where its marker stands when
 * a frequency or a time is asked, else its value, in whatever unit. A difference taken the other way about is turned round.
 */
export function givenBy(reading: BenchReading, question: Asked): number {
	const number = numberOf(reading, question);
	return isTurned(reading, question) ? -number : number;
}

function numberOf(reading: BenchReading, { part, unit }: Asked): number {
	const parts = partsOf(reading);
	const asked = part === undefined ? undefined : partOf(parts, part);
	if (asked !== undefined) return asked;
	if (reading.unit === unit) return reading.value;
	const place = unit === 'Hz' ? 'frequencyHz' : unit === 's' ? 'timeS' : undefined;
	return (place && partOf(parts, place)) ?? reading.value;
}

function isTurned(reading: BenchReading, { quantity }: Asked): boolean {
	if (quantity.kind !== 'delta' || reading.kind !== 'delta') return false;
	const upwards = (partOf(partsOf(reading), 'frequencyHz') ?? 0) >= 0;
	return upwards !== quantity.toHz >= quantity.fromHz;
}

export const partsOf = (reading: BenchReading): unknown => ('parts' in reading ? reading.parts : undefined);
