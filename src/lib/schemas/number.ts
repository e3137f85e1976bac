/** Numbers that cross the wire: finite, with the limits the bench can honour. */
import { z } from 'zod';

export const finite = z.number({ error: 'must be a number' });
export const positive = z.number({ error: 'must be a number' }).positive('must be greater than 0');
/** Frequency in Hz, 0 to 100 GHz. */
export const frequency = z
	.number({ error: 'must be a number' })
	.min(0, 'must not be below 0')
	.max(100e9, 'must not be above 100 GHz');
/** Level in dBm; the span covers what any receiver here could meet. */
export const levelDbm = z.number().min(-250).max(100);
