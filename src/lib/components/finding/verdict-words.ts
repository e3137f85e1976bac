/** What each verdict is called. */
import type { Verdict } from '$lib/schemas/finding';

export const verdictWords: Record<Verdict, string> = {
	right: 'right',
	'right-but-method': 'right, but by luck',
	wrong: 'wrong',
	unanswered: 'not answered'
};
