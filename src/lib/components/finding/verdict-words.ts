/** What each verdict is called. */
import type { Verdict } from '$lib/schemas/questions/finding';

export const verdictWords: Record<Verdict, string> = {
	right: 'right',
	'right-but-method': 'right, but see how',
	wrong: 'wrong',
	unanswered: 'not answered'
};
