/** The ladder at the edge of a finding's plot: from the learner's number up (or down) to the true one. */
import type { FindingLadder } from '$lib/schemas/questions/finding';
import { spreadLabels } from './spread-labels';

export interface Rung {
	kind: 'yours' | 'part' | 'true';
	/** px on the ladder that the words belong to: a part's is the middle of its stretch. */
	y: number;
	/** Middle of the words, px. */
	labelY: number;
	value: number;
	text: string;
}

export interface LadderLayout {
	/** Where the oblique ticks stand, px. */
	nodes: number[];
	rungs: Rung[];
}

const linePx = 17;
const figurePx = 24;

/**
 * @param y level on the ladder → px
 * @param textWidthPx room for the words, which break over lines
 */
export function ladderLayout(
	ladder: FindingLadder,
	y: (value: number) => number,
	bounds: { from: number; to: number },
	textWidthPx: number
): LadderLayout {
	const lines = (text: string) => Math.max(1, Math.ceil((text.length * 6.3) / textWidthPx));
	const rungs: (Omit<Rung, 'labelY'> & { size: number })[] = [
		{ kind: 'yours', y: y(ladder.yours), value: ladder.yours, text: 'yours', size: linePx + 4 },
		...ladder.parts.map(({ from, to, change, text }) => ({
			kind: 'part' as const,
			y: (y(from) + y(to)) / 2,
			value: change,
			text,
			size: figurePx + lines(text) * linePx
		})),
		{ kind: 'true', y: y(ladder.true), value: ladder.true, text: 'true', size: linePx + 4 }
	];
	const middles = spreadLabels(
		rungs.map((rung) => ({ at: rung.y, size: rung.size })),
		bounds,
		4
	);
	return {
		nodes: [y(ladder.yours), ...ladder.parts.map(({ to }) => y(to))],
		rungs: rungs.map(({ size: _, ...rung }, i) => ({ ...rung, labelY: middles[i] }))
	};
}
