/** A moment as a day, "2 March", in UTC: the server knows no other clock. @param iso date and time */
export const dayOf = (iso: string): string =>
	new Date(iso).toLocaleDateString('en-GB', { day: 'numeric', month: 'long', timeZone: 'UTC' });
