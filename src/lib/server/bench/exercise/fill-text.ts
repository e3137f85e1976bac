import { parseExpression, type Scope } from './expression';
import { figure, shortFigure } from './figure';

const PLACEHOLDER = /\{([^{}|]+)(?:\|\s*(\d)\s*)?\}/g;

/** A text with {name} and {expression | digits} replaced by figures. @throws BenchError naming `field` */
export function fillText(text: string, scope: Scope, field: string): string {
	return text.replace(PLACEHOLDER, (_, source: string, digits?: string) => {
		const value = parseExpression(source, field).evaluate(scope);
		return digits === undefined ? shortFigure(value) : figure(value, Number(digits));
	});
}

/** Names that the placeholders of a text use. */
export function namesInText(text: string, field: string): string[] {
	return [...text.matchAll(PLACEHOLDER)].flatMap(([, source]) => parseExpression(source, field).names);
}
