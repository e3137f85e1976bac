/** What a person may be; one person may be several. */
export const roles = ['apprentice', 'instructor', 'coordinator', 'company-contact', 'administrator'] as const;

export type Role = (typeof roles)[number];

/** The role in words, as it is shown. */
export const roleName = (role: Role): string => role.replace('-', ' ');

/** Whoever asks: the one thing that every service is given first. */
export interface Actor {
	id: number;
	roles: readonly Role[];
}
