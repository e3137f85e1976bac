import { quantity as quantitySchema, type Quantity } from '$lib/schemas/quantity';
import type { Template } from '$lib/schemas/template';
import type { Scope } from '$lib/server/bench/exercise/expression';
import { filled } from '$lib/server/bench/exercise/filled';
import { truth } from '$lib/server/bench/truth/truth';
import type { Draw } from './question-type';

/** The draw's values with true ones of the scene beside them, by the names that a question gives them. */
export const withTruths = (
	truths: Record<string, Template<Quantity>>,
	{ scene, scope }: Draw,
	field: string
): Scope => ({
	...scope,
	...Object.fromEntries(
		Object.entries(truths).map(([name, asked]) => [
			name,
			truth(scene, filled(quantitySchema, asked, scope, `${field}.truths.${name}`)).value
		])
	)
});
