import type { Truthful, When } from '$lib/schemas/questions/words';
import { parseExpression, type Scope } from './expression';

/** Whether each named parameter has (one of) the given value(s). */
export const holds = (when: When | undefined, scope: Scope): boolean =>
	Object.entries(when ?? {}).every(([name, wanted]) => [wanted].flat().includes(scope[name]));

/** Whether something holds on a draw. @throws BenchError naming `field` when its expression can't be evaluated */
export function isTrue(stated: Truthful, scope: Scope, field: string): boolean {
	if (typeof stated === 'boolean') return stated;
	if (typeof stated === 'string') return parseExpression(stated, field).evaluate(scope) !== 0;
	return holds(stated, scope);
}
