import { MODEL_SPREAD_DB, type Context, type Prediction } from './mistake';
import { setUpOf } from './set-up-of';
import type { Watched } from './watched-mistakes';

/**
 * What theory says a mistake gives when it is made in the taught method.
 * Null when it can't be made there.
 */
export function predictMistake({ mistake }: Watched, context: Context): Prediction | null {
	const { drawn, question } = context;
	if (mistake.stage === 'slip') {
		return {
			value: question.truth + mistake.change(context),
			spread: MODEL_SPREAD_DB
		};
	}
	return mistake.predict(context, setUpOf(drawn, mistake.make(drawn.method, context), question.id));
}
