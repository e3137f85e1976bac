import { isMap, isNode, type Document, type LineCounter } from 'yaml';
import { pathOf } from './zod-issues';

/** Line of the entry a field names, or of the nearest one around it that is there. */
export function lineOf(document: Document, lines: LineCounter, field: string): number | undefined {
	for (let path = pathOf(field); path.length > 0; path = path.slice(0, -1)) {
		const around = path.length > 1 ? document.getIn(path.slice(0, -1), true) : document.contents;
		const pair = isMap(around)
			? around.items.find(({ key }) => String(key) === String(path.at(-1)))
			: undefined;
		const node = isNode(pair?.key) ? pair.key : document.getIn(path, true);
		if (isNode(node) && node.range) return lines.linePos(node.range[0]).line;
	}
	return undefined;
}
