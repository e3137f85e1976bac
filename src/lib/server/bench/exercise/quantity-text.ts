import { formatFrequency, formatTime, joinShown, showMeasured } from '$lib/units/format-quantity';
import { figure } from './figure';

/**
 * A number and its unit for people: “−47.2 dBm”, “12.35 kHz”, “570 ms”.
 * @param digits decimals of `unit`, below 0 to round to tens; absent: one of a level, and what a frequency or time needs
 */
export function quantityText(value: number, unit: string, digits?: number): string {
	if (unit === 'Hz' && digits === undefined) return formatFrequency(value);
	if (unit === 's' && digits === undefined) return formatTime(value);
	if ((unit === 'Hz' || unit === 's') && digits !== undefined)
		return joinShown(showMeasured(value, unit, digits));
	return `${figure(value, digits ?? 1)}${unit === '1' ? '' : ` ${unit}`}`;
}
