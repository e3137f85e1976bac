import type { Context, Prediction } from './mistake';
import { setUpOf } from './set-up-of';
import { modelSpread } from './spreads';
import type { Watched } from './watched-mistakes';

/**
 * What theory says a mistake gives when it is made in the taught method.
 * Null when it can't be made there.
 */
export function predictMistake({ mistake }: Watched, context: Context): Prediction | null {
	const { drawn, question } = context;
	const setUp = setUpOf(drawn, mistake.make(drawn.method, context), question.id);
	if (mistake.stage === 'reading') return mistake.predict(context, setUp);
	const change = mistake.change(context, setUp);
	if (change === null) return null;
	const spread = Math.hypot(modelSpread(question), mistake.spread?.(context, setUp) ?? 0);
	return { value: question.truth + change, spread };
}
