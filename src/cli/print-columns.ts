/** Lines of cells in columns: the first `left` of them set to the left, the rest to the right; the last one, where it is words, ends the line. */
export function printColumns(lines: readonly (readonly string[])[], left: number): string[] {
	const widths = lines[0].map((_, column) => Math.max(...lines.map((line) => line[column].length)));
	return lines.map((line) =>
		line
			.map((cell, column) => (column < left ? cell.padEnd(widths[column]) : cell.padStart(widths[column])))
			.join('  ')
			.trimEnd()
	);
}
