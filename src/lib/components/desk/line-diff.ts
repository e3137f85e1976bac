/** How one text became another, line by line: the longest common run of lines stays, the rest went or came. */
export interface DiffLine {
	kind: 'same' | 'gone' | 'new';
	text: string;
}

/** Lines beyond this in either text are compared as one piece: the table would be too large for a page. */
const MOST_LINES = 2000;

export function lineDiff(before: string, after: string): DiffLine[] {
	const a = before.split('\n');
	const b = after.split('\n');
	let start = 0;
	while (start < a.length && start < b.length && a[start] === b[start]) start++;
	let end = 0;
	while (end < a.length - start && end < b.length - start && a[a.length - 1 - end] === b[b.length - 1 - end])
		end++;
	const same = (text: string): DiffLine => ({ kind: 'same', text });
	return [
		...a.slice(0, start).map(same),
		...middle(a.slice(start, a.length - end), b.slice(start, b.length - end)),
		...a.slice(a.length - end).map(same)
	];
}

function middle(a: string[], b: string[]): DiffLine[] {
	const gone = (text: string): DiffLine => ({ kind: 'gone', text });
	const come = (text: string): DiffLine => ({ kind: 'new', text });
	if (a.length > MOST_LINES || b.length > MOST_LINES) return [...a.map(gone), ...b.map(come)];
	// common[i][j]: lines that a from i and b from j have in common, at most.
	const width = b.length + 1;
	const common = new Uint16Array((a.length + 1) * width);
	for (let i = a.length - 1; i >= 0; i--)
		for (let j = b.length - 1; j >= 0; j--)
			common[i * width + j] =
				a[i] === b[j]
					? common[(i + 1) * width + j + 1] + 1
					: Math.max(common[(i + 1) * width + j], common[i * width + j + 1]);
	const lines: DiffLine[] = [];
	let [i, j] = [0, 0];
	while (i < a.length || j < b.length) {
		if (i < a.length && j < b.length && a[i] === b[j]) {
			lines.push({ kind: 'same', text: a[i++] });
			j++;
		} else if (j >= b.length || (i < a.length && common[(i + 1) * width + j] >= common[i * width + j + 1]))
			lines.push(gone(a[i++]));
		else lines.push(come(b[j++]));
	}
	return lines;
}

/** The same with long runs of unchanged lines left out: `null` stands for such a run. */
export function foldedDiff(lines: readonly DiffLine[], around = 3): (DiffLine | null)[] {
	const near = lines.map((_, i) =>
		lines.slice(Math.max(0, i - around), i + around + 1).some(({ kind }) => kind !== 'same')
	);
	return lines.flatMap((line, i) => (near[i] ? [line] : i === 0 || near[i - 1] ? [null] : []));
}
