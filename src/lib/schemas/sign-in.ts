import { z } from 'zod';

/** What the sign-in form sends. The bounds only keep absurd sizes out: whether it is right, the account decides. */
export const signInForm = z.object({
	email: z
		.string('Give the e-mail address of your account.')
		.refine((text) => text.trim() !== '', 'Give the e-mail address of your account.')
		.max(254, 'No e-mail address is longer than 254 characters.'),
	password: z
		.string('Give your password.')
		.min(1, 'Give your password.')
		.max(1024, 'No password here is longer than 1024 characters.')
});

export type SignInForm = z.infer<typeof signInForm>;
