/** A reading's figure, unit and spread as the bench writes them, in the unit chosen for levels. */
import type { Shown } from '$lib/units/format-quantity';
import { levelSpread, showLevel, type LevelScale } from '../levels/level-scale';
import { shownReading, shownSpread, spreadDigits } from '../shown-quantity';
import type { ReadingRow } from './reading-row';

/** Where the level stands, Hz: an antenna's factor depends on it. */
function placeHz({ outcome, atHz, relative }: ReadingRow, centreHz: number): number {
	const parts = outcome && 'value' in outcome ? outcome.parts : undefined;
	const found = parts && 'frequencyHz' in parts ? parts.frequencyHz : undefined;
	return found ?? (relative ? undefined : atHz) ?? centreHz;
}

/** @returns undefined while there is no number */
export function shownOutcome(row: ReadingRow, scale: LevelScale, centreHz: number): Shown | undefined {
	if (!row.outcome || !('value' in row.outcome)) return undefined;
	const { value, unit, spread } = row.outcome;
	if (unit === 'dBm') return showLevel(value, scale, placeHz(row, centreHz));
	return shownReading(value, unit, row.request.kind === 'count' ? spread : undefined);
}

/** "±0.2"; empty where there is none. */
export function shownOutcomeSpread(row: ReadingRow, scale: LevelScale): string {
	if (!row.outcome || !('value' in row.outcome)) return '';
	const { value, unit, spread } = row.outcome;
	if (unit !== 'dBm') return shownSpread(spread, value, unit);
	return spread > 0 ? `±${levelSpread(spread, value, scale, spreadDigits)}` : '';
}
