/** Puts the cursor at the start of a line of a text field, from 1, and the line into sight. */
export function goToLine(area: HTMLTextAreaElement | undefined, line: number): void {
	if (!area) return;
	const lines = area.value.split('\n');
	const start = lines.slice(0, line - 1).reduce((sum, text) => sum + text.length + 1, 0);
	area.focus();
	area.setSelectionRange(start, start + (lines[line - 1]?.length ?? 0));
	area.scrollTop = (area.scrollHeight * Math.max(0, line - 4)) / lines.length;
}
