import { z } from 'zod';

/** The choice of a colour scheme, and the path of the page it was made on. */
export const schemeForm = z.object({
	scheme: z.enum(['day', 'night'], 'The scheme is either day or night.'),
	next: z.string().max(2000).default('/')
});
