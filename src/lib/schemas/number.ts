/** Numbers that cross the wire: finite, with the limits the bench can honour. */
import { z } from 'zod';

/** No quantity of a bench, in the unit of its name, comes near this; what is larger would only overflow further on. */
const LARGEST = 1e15;

export const finite = z
	.number({ error: 'must be a number' })
	.min(-LARGEST, 'must not be below −10¹⁵')
	.max(LARGEST, 'must not be above 10¹⁵');
export const positive = z
	.number({ error: 'must be a number' })
	.positive('must be greater than 0')
	.max(LARGEST, 'must not be above 10¹⁵');
/** A whole number in a query, in digits: an empty text is none. */
export const digits = z
	.string('must be a number')
	.regex(/^\d{1,15}$/, 'must be a whole number in digits')
	.transform(Number);
/** Frequency in Hz, 0 to 100 GHz. */
export const frequency = z
	.number({ error: 'must be a number' })
	.min(0, 'must not be below 0')
	.max(100e9, 'must not be above 100 GHz');
/** Level in dBm; the span covers what any receiver here could meet. */
export const levelDbm = z.number().min(-250).max(100);
