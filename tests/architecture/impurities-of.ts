import ts from 'typescript';

const CHANCE_AND_CLOCK = [
	'Math.random',
	'Date.now',
	'performance.now',
	'crypto.randomUUID',
	'crypto.getRandomValues'
];
const OUTSIDE = ['process', 'console', 'window', 'document', 'localStorage', 'sessionStorage', 'navigator'];
const CALLS = ['Date', 'fetch', 'setTimeout', 'setInterval', 'setImmediate', 'queueMicrotask', 'require'];

/** What in a file reaches for the clock, for chance or for the world outside. */
export function impuritiesOf(source: ts.SourceFile): string[] {
	const own = namesDeclaredIn(source);
	return nodesOf(source).flatMap((node) => impurityOf(node, own) ?? []);
}

/** Names that the file gives to things of its own: a `window` may be a stretch of a trace. */
function namesDeclaredIn(source: ts.SourceFile): Set<string> {
	return new Set(
		nodesOf(source).flatMap((node) =>
			(ts.isParameter(node) || ts.isVariableDeclaration(node) || ts.isBindingElement(node)) &&
			ts.isIdentifier(node.name)
				? node.name.text
				: []
		)
	);
}

function nodesOf(node: ts.Node): ts.Node[] {
	const nodes = [node];
	ts.forEachChild(node, (child) => void nodes.push(...nodesOf(child)));
	return nodes;
}

function impurityOf(node: ts.Node, own: Set<string>): string | undefined {
	if (ts.isNewExpression(node) && node.expression.getText() === 'Date' && !node.arguments?.length)
		return 'new Date()';
	if (ts.isCallExpression(node) && CALLS.includes(node.expression.getText()))
		return `${node.expression.getText()}()`;
	if (!ts.isPropertyAccessExpression(node)) return undefined;
	const text = node.getText().replace(/^globalThis\./, '');
	if (CHANCE_AND_CLOCK.includes(text)) return text;
	if (!ts.isIdentifier(node.expression)) return undefined;
	const { text: name } = node.expression;
	return OUTSIDE.includes(name) && !own.has(name) ? text : undefined;
}
