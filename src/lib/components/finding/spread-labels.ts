/** Keeps labels that stand at given places from overlapping. */

/**
 * Moves labels along one direction, no farther than they must: each as near to its own place as its neighbours let it.
 * @param labels where the middle of each would like to be, and how much room it takes, px; in any order
 * @param bounds the room there is, px
 * @param gapPx between neighbours at least
 * @returns the middles, in the order of `labels`
 */
export function spreadLabels(
	labels: readonly { at: number; size: number }[],
	bounds: { from: number; to: number },
	gapPx: number
): number[] {
	const order = labels.map((_, i) => i).sort((a, b) => labels[a].at - labels[b].at);
	let groups: { members: number[]; start: number; size: number }[] = [];
	for (const i of order) {
		let group = { members: [i], start: labels[i].at - labels[i].size / 2, size: labels[i].size };
		group.start = hold(group, bounds);
		let before = groups.at(-1);
		while (before && before.start + before.size + gapPx > group.start) {
			groups = groups.slice(0, -1);
			group = merged(before, group, labels, bounds, gapPx);
			before = groups.at(-1);
		}
		groups.push(group);
	}
	const middles: number[] = [];
	for (const { members, start } of groups) {
		let at = start;
		for (const i of members) {
			middles[i] = at + labels[i].size / 2;
			at += labels[i].size + gapPx;
		}
	}
	return middles;
}

interface Group {
	members: number[];
	start: number;
	size: number;
}

const hold = ({ start, size }: Group, { from, to }: { from: number; to: number }) =>
	Math.max(from, Math.min(to - size, start));

/** Two groups that touch become one, placed where its members are nearest to home on average. */
function merged(
	first: Group,
	second: Group,
	labels: readonly { at: number; size: number }[],
	bounds: { from: number; to: number },
	gapPx: number
): Group {
	const members = [...first.members, ...second.members];
	const size = first.size + gapPx + second.size;
	let offset = 0;
	let sum = 0;
	for (const i of members) {
		sum += labels[i].at - (offset + labels[i].size / 2);
		offset += labels[i].size + gapPx;
	}
	const group = { members, size, start: sum / members.length };
	return { ...group, start: hold(group, bounds) };
}
