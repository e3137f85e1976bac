/** Numbers that cross the wire: finite, with the limits the bench can honour. */
import { z } from 'zod';

export const finite = z.number();
export const positive = z.number().positive();
/** Frequency in Hz, 0 to 100 GHz. */
export const frequency = z.number().min(0).max(100e9);
/** Level in dBm; the span covers what any receiver here could meet. */
export const levelDbm = z.number().min(-250).max(100);
