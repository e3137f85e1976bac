import { parseExpression, type Scope } from './expression';

const isExpression = (value: unknown): value is string => typeof value === 'string' && value.startsWith('=');

/**
 * A copy of `template` with every "=expression" replaced by its number.
 * @param field where the template stands, for refusals ("scene"); the path within is added
 * @throws BenchError naming the entry whose expression can't be evaluated
 */
export function fillTemplate(template: unknown, scope: Scope, field: string): unknown {
	if (isExpression(template)) return parseExpression(template, field).evaluate(scope);
	if (Array.isArray(template)) return template.map((item, i) => fillTemplate(item, scope, `${field}[${i}]`));
	if (template === null || typeof template !== 'object') return template;
	return Object.fromEntries(
		Object.entries(template).map(([key, value]) => [key, fillTemplate(value, scope, `${field}.${key}`)])
	);
}

/** Calls `visit` for every expression in `template`, with the place it stands in. */
export function eachExpression(
	template: unknown,
	field: string,
	visit: (text: string, field: string) => void
): void {
	if (isExpression(template)) visit(template, field);
	else if (Array.isArray(template))
		template.forEach((item, i) => eachExpression(item, `${field}[${i}]`, visit));
	else if (template !== null && typeof template === 'object') {
		for (const [key, value] of Object.entries(template)) eachExpression(value, `${field}.${key}`, visit);
	}
}
