/**
 * The text of an exercise with another absolute tolerance at one question; null where the text isn't laid out so that
 * it can be found. Everything else stays as its author wrote it.
 */
export function withTolerance(text: string, question: string, tolerance: number): string | null {
	const lines = text.split('\n');
	const head = lines.findIndex((line) => /^questions:/.test(line));
	if (head < 0) return null;
	const starts = (line: string) => /^\s*-\s/.test(line) || /^\S/.test(line);
	const at = lines.findIndex(
		(line, i) => i > head && new RegExp(`^\\s*-\\s+id:\\s*['"]?${question}['"]?\\s*$`).test(line)
	);
	if (at < 0) return null;
	const indent = /^\s*/.exec(lines[at])![0].length;
	for (let i = at + 1; i < lines.length; i++) {
		const own = /^\s*/.exec(lines[i])![0].length;
		if (lines[i].trim() !== '' && own <= indent && starts(lines[i])) return null;
		const inline = /^(\s*tolerance:\s*\{\s*absolute:\s*)[^,}\s]+(.*)$/.exec(lines[i]);
		const below =
			/^\s*tolerance:\s*$/.test(lines[i]) && /^(\s*absolute:\s*)\S+(.*)$/.exec(lines[i + 1] ?? '');
		if (!inline && !below) continue;
		const [, before, after] = (inline || below) as RegExpExecArray;
		return lines.with(inline ? i : i + 1, `${before}${tolerance}${after}`).join('\n');
	}
	return null;
}
