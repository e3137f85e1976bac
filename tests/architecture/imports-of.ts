import { posix } from 'node:path';
import ts from 'typescript';

/** Module specifiers of a source file: imports, re-exports, `import()`, types of `import('…')`, and `import.meta.glob`. */
export function specifiersOf(source: ts.SourceFile): string[] {
	const found: string[] = [];
	const take = (node: ts.Node | undefined) => {
		if (node && ts.isStringLiteralLike(node)) found.push(node.text);
		else if (node && ts.isArrayLiteralExpression(node)) node.elements.forEach(take);
	};
	const visit = (node: ts.Node): void => {
		if (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) take(node.moduleSpecifier);
		else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) take(node.argument.literal);
		else if (ts.isCallExpression(node) && loadsModules(node.expression)) take(node.arguments[0]);
		ts.forEachChild(node, visit);
	};
	visit(source);
	return found;
}

function loadsModules(callee: ts.Expression): boolean {
	if (callee.kind === ts.SyntaxKind.ImportKeyword) return true;
	const text = callee.getText();
	return text === 'require' || text === 'import.meta.glob';
}

/** The TypeScript of a file: all of it, or the scripts of a Svelte component. */
export function parse(file: string, text: string): ts.SourceFile {
	const code = file.endsWith('.svelte')
		? [...text.matchAll(/<script\b[^>]*>([\s\S]*?)<\/script>/g)].map((match) => match[1]).join('\n')
		: text;
	return ts.createSourceFile(file, code, ts.ScriptTarget.Latest, true, ts.ScriptKind.TS);
}

/** Path in this repository that a specifier names, or undefined if it names a package or what the framework makes. */
export function targetOf(file: string, specifier: string): string | undefined {
	if (specifier.startsWith('$lib/')) return `src/lib/${specifier.slice('$lib/'.length)}`;
	if (specifier.startsWith('/')) return specifier.slice(1).replace(/\/[^/]*\*.*$/, '');
	if (!specifier.startsWith('.')) return undefined;
	return posix.join(posix.dirname(file), specifier);
}

/** `$app` of `$app/state`, `@scope/name` of `@scope/name/part`, `node:` of every module of Node.js. */
export function packageOf(specifier: string): string {
	if (specifier.startsWith('node:')) return 'node:';
	const parts = specifier.split('/');
	return specifier.startsWith('@') ? parts.slice(0, 2).join('/') : parts[0];
}
