import { isMap, isNode, isSeq, LineCounter, parseDocument, type Document } from 'yaml';
import type { z } from 'zod';
import { issuesOf, pathOf } from '$lib/server/bench/exercise/zod-issues';
import { ContentError } from './content-error';
import { addressIn, textIn, type ContentTree } from './content-tree';

/** A YAML file of a course by its schema, and how to name a fault in it. @throws ContentError at its first fault */
export function readYaml<S extends z.ZodType>(tree: ContentTree, path: string, schema: S) {
	const lines = new LineCounter();
	const document = parseDocument(textIn(tree, path), { lineCounter: lines, uniqueKeys: true });
	const address = addressIn(tree, path);
	const [fault] = document.errors;
	if (fault)
		throw new ContentError(address, lines.linePos(fault.pos[0]).line, '', fault.message.split('\n')[0]);
	const errorAt = (field: string, reason: string) =>
		new ContentError(address, lineOf(document, lines, pathOf(field)), field, reason);
	const parsed = schema.safeParse(document.toJS());
	if (parsed.success) return { value: parsed.data as z.output<S>, errorAt };
	const [issue] = issuesOf(parsed.error);
	throw errorAt(issue.field, issue.message);
}

/** The line of the deepest part of `path` that the document has; a key stands on the line of its name. */
function lineOf(document: Document, lines: LineCounter, path: (string | number)[]): number {
	let offset = 0;
	let node: unknown = document.contents;
	for (const step of path) {
		const pair = isMap(node) ? node.items.find((item) => String(item.key) === String(step)) : undefined;
		const place = pair ? pair.key : isSeq(node) ? node.items[Number(step)] : undefined;
		if (!isNode(place) || !place.range) break;
		offset = place.range[0];
		node = pair ? pair.value : place;
	}
	return lines.linePos(offset).line;
}
