/**
 * Arithmetic over named values, for exercises. mathjs only parses; what its tree may hold is decided here, and the tree is
 * evaluated here, so that nothing but numbers, names from the scope and the listed functions can ever be reached.
 */
import { parse, type MathNode } from 'mathjs/number';
import { BenchError } from '../bench-error';

export type Scope = Readonly<Record<string, number | string>>;
type Compiled = (scope: Scope) => number;

const FUNCTIONS: ReadonlyMap<string, (...values: number[]) => number> = new Map([
	['abs', Math.abs],
	['ceil', Math.ceil],
	['exp', Math.exp],
	['floor', Math.floor],
	['ln', Math.log],
	['log10', Math.log10],
	['max', Math.max],
	['min', Math.min],
	['round', Math.round],
	['sqrt', Math.sqrt]
] as [string, (...values: number[]) => number][]);

const OPERATORS: ReadonlyMap<string, (a: number, b: number) => number> = new Map([
	['add', (a, b) => a + b],
	['subtract', (a, b) => a - b],
	['multiply', (a, b) => a * b],
	['divide', (a, b) => a / b],
	['pow', (a, b) => a ** b],
	['unaryMinus', (a) => -a],
	['unaryPlus', (a) => a],
	// Comparisons give 1 for yes and 0 for no.
	['larger', (a, b) => Number(a > b)],
	['largerEq', (a, b) => Number(a >= b)],
	['smaller', (a, b) => Number(a < b)],
	['smallerEq', (a, b) => Number(a <= b)]
] as [string, (a: number, b: number) => number][]);

const MAX_LENGTH = 200;
const MAX_DEPTH = 20;

export interface Expression {
	/** Names it needs from the scope, each once. */
	names: string[];
	/** @throws BenchError when a name is missing or not a number, or the result isn't finite */
	evaluate(scope: Scope): number;
}

const compiled = new Map<string, Expression>();

/**
 * Parses `text` ("carrierDbm - 3", with or without a leading "=").
 * @param field names the place in the exercise, for the refusal
 * @throws BenchError for anything but numbers, names, + - * / ^, parentheses and the listed functions
 */
export function parseExpression(text: string, field: string): Expression {
	const source = text.replace(/^=/, '').trim();
	const known = compiled.get(source);
	if (known) return known;
	if (source.length > MAX_LENGTH) throw new BenchError(field, `at most ${MAX_LENGTH} characters`);
	const names = new Set<string>();
	const run = compile(treeOf(source, field), names, field, 0);
	const expression: Expression = {
		names: [...names],
		evaluate(scope) {
			const value = run(scope);
			if (!Number.isFinite(value)) throw new BenchError(field, `"${source}" gives no finite number`);
			return value;
		}
	};
	compiled.set(source, expression);
	return expression;
}

function treeOf(source: string, field: string): MathNode {
	try {
		return parse(source);
	} catch (cause) {
		throw new BenchError(field, `can't read "${source}": ${(cause as Error).message}`);
	}
}

/** The only fields of a parse tree that are looked at. */
interface Node {
	type: string;
	value?: unknown;
	name?: string;
	fn?: string | { type: string; name: string };
	args?: MathNode[];
	content?: MathNode;
	implicit?: boolean;
}

function compile(tree: MathNode, names: Set<string>, field: string, depth: number): Compiled {
	const refuse = (what: string): never => {
		throw new BenchError(field, `${what} can't stand in an expression: only numbers, names and arithmetic`);
	};
	if (depth > MAX_DEPTH) refuse('so deep a nesting');
	const node = tree as unknown as Node;
	const inner = (child: MathNode) => compile(child, names, field, depth + 1);
	switch (node.type) {
		case 'ConstantNode': {
			const value = node.value;
			if (typeof value !== 'number' || !Number.isFinite(value)) return refuse(`"${String(value)}"`);
			return () => value;
		}
		case 'ParenthesisNode':
			return inner(node.content as MathNode);
		case 'SymbolNode': {
			const name = node.name as string;
			names.add(name);
			return (scope) => valueOf(scope, name, field);
		}
		case 'OperatorNode': {
			const act = OPERATORS.get(String(node.fn));
			if (!act) return refuse(`"${String(node.fn)}"`);
			if (node.implicit) return refuse('a product without *');
			const [first, second = () => 0] = (node.args ?? []).map(inner);
			return (scope) => act(first(scope), second(scope));
		}
		case 'FunctionNode': {
			const called = node.fn as { type: string; name: string };
			const act = called.type === 'SymbolNode' ? FUNCTIONS.get(called.name) : undefined;
			if (!act) return refuse(`calling ${called.name ?? 'that'}`);
			const values = (node.args ?? []).map(inner);
			if (values.length === 0) return refuse(`${called.name} without a value`);
			return (scope) => act(...values.map((value) => value(scope)));
		}
		default:
			return refuse(node.type.replace(/Node$/, '').toLowerCase());
	}
}

function valueOf(scope: Scope, name: string, field: string): number {
	const value = Object.hasOwn(scope, name) ? scope[name] : undefined;
	if (typeof value !== 'number') throw new BenchError(field, `no number is called ${name} here`);
	return value;
}
