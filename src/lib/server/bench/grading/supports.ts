import type { DrawnQuestion } from '../exercise/drawn-exercise';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import { familyOf, type Source } from './evidence';
import { sameWidth, widthHzOf } from './read-width';

/** Whether a reading is of what the question asks: the same quantity, at the same place, over the same width. */
export function supports({ request, family }: Source, { quantity, frequencyHz }: DrawnQuestion): boolean {
	const asked = familyOf(quantity.kind);
	if (family !== asked || (asked === 'other' && request.kind !== quantity.kind)) return false;
	const width = widthHzOf(request);
	const wanted = widthHzOf(quantity);
	const offHz = Math.abs((quantityFrequencyHz(request) || frequencyHz) - frequencyHz);
	if (asked === 'band') {
		return width !== undefined && wanted !== undefined && sameWidth(width, wanted) && offHz < 0.05 * wanted;
	}
	if (asked === 'density' && wanted !== undefined) return (width ?? 0) < 1.5 * wanted && offHz < 0.5 * wanted;
	return wanted === undefined || offHz < wanted;
}
