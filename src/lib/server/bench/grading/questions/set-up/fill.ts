import type { WrittenSetUp } from '$lib/schemas/questions/set-up';
import { settings as settingsSchema } from '$lib/schemas/settings';
import type { SetUpQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import { fillText } from '$lib/server/bench/exercise/fill-text';
import { filled } from '$lib/server/bench/exercise/filled';
import type { Draw } from '../question-type';
import { fillConditions } from './fill-conditions';

export const fillSetUp = (written: WrittenSetUp, { scope }: Draw, field: string): SetUpQuestion => ({
	type: 'set-up',
	id: written.id,
	text: fillText(written.text, scope, `${field}.text`),
	conditions: fillConditions(written.conditions, scope, `${field}.conditions`),
	mistakes: written.mistakes.map(({ id, settings, breaks }, i) => ({
		id,
		settings: filled(settingsSchema, settings, scope, `${field}.mistakes[${i}].settings`),
		breaks
	}))
});
