import { z } from 'zod';
import { deviceKinds } from './device-kind';

const NAME_LIMIT = 120;

/** Spaces at the ends and in rows are of no use in a name; signs that can't be seen would let one name pass for another. */
export const displayNameForm = z.object({
	displayName: z
		.string('Give a name.')
		.transform((text) => text.normalize('NFC').replace(/\s+/g, ' ').trim())
		.pipe(
			z
				.string()
				.min(1, 'Give a name.')
				.max(NAME_LIMIT, `No name here is longer than ${NAME_LIMIT} characters.`)
				.refine((text) => !/\p{C}/u.test(text), 'Leave out signs that can’t be seen.')
				.refine((text) => /\p{L}/u.test(text), 'A name has at least one letter.')
		)
});

const password = (missing: string) =>
	z.string(missing).min(1, missing).max(1024, 'No password here is longer than 1024 characters.');

export const passwordForm = z
	.object({
		presentPassword: password('Give the password you sign in with now.'),
		newPassword: password('Give a new password.'),
		newPasswordAgain: password('Give the new password a second time.')
	})
	.refine(({ newPassword, newPasswordAgain }) => newPassword === newPasswordAgain, {
		path: ['newPasswordAgain'],
		message: 'This is not the new password given above.'
	})
	.refine(({ presentPassword, newPassword }) => presentPassword !== newPassword, {
		path: ['newPassword'],
		message: 'This is the password you have now.'
	});

export const endSessionForm = z.object({
	session: z
		.string('Say which session.')
		.regex(/^[1-9]\d{0,14}$/, 'There is no such session.')
		.transform(Number)
});

/** An open sign-in as its owner sees it. */
export const sessionView = z.strictObject({
	/** What it is ended by; opens nothing. */
	number: z.int(),
	device: z.enum(deviceKinds),
	signedInAt: z.iso.datetime(),
	/** To within five minutes. */
	lastUsedAt: z.iso.datetime(),
	expiresAt: z.iso.datetime(),
	/** The one that asks. */
	current: z.boolean()
});

export type PasswordChange = z.infer<typeof passwordForm>;
export type SessionView = z.infer<typeof sessionView>;
