/** Where the parts of the chain sketch stand: boxes and leads on one wire, the reference plane across it. */
import type { ChainPart } from '$lib/schemas/exercise';

export type PlacedPart =
	| {
			part: 'box';
			x: number;
			width: number;
			lines: string[];
			branch?: { label: string; x: number; end: 'start' | 'end' };
	  }
	| { part: 'lead' | 'pad'; x: number; width: number; lines: string[] }
	| { part: 'plane'; x: number; label: string; textX: number };

export interface ChainLayout {
	parts: PlacedPart[];
	/** Straight pieces of wire between the parts, from and to in px. */
	wires: { x0: number; x1: number }[];
}

/** Width of a character of 12.5 px text, near enough to lay out by. */
export const characterPx = 6;
/** Length of a straight wire between two parts: as much of this as there is room for. */
const wirePx = { least: 8, most: 18 };
const leastLeadPx = 46;
const textPx = (text: string) => text.length * characterPx;

/** Breaks a label into at most two lines at the space nearest its middle. */
export function twoLines(label: string): string[] {
	const spaces = [...label].flatMap((c, i) => (c === ' ' ? [i] : []));
	if (spaces.length === 0) return [label];
	const middle = spaces.reduce((best, i) =>
		Math.abs(i - label.length / 2) < Math.abs(best - label.length / 2) ? i : best
	);
	return [label.slice(0, middle), label.slice(middle + 1)];
}

/**
 * Lays the chain out over `width` px: boxes as wide as their words, one wire's length between neighbours, and what is
 * left to the leads. Labels break into two lines when the words don't fit on one.
 */
export function chainLayout(chain: readonly ChainPart[], width: number): ChainLayout {
	const solid = chain.filter((part) => part.part !== 'plane');
	const gaps = Math.max(1, solid.length - 1);
	const sum = (widths: number[]) => widths.reduce((total, w) => total + w, 0);
	const whole = solid.map((part) => partPx(part, [part.label]));
	const broken = sum(whole) + gaps * wirePx.least > width;
	const widths = broken ? solid.map((part) => partPx(part, twoLines(part.label))) : whole;
	const gapPx = Math.min(wirePx.most, Math.max(wirePx.least, (width - sum(widths)) / gaps));
	const spare = Math.max(0, width - sum(widths) - gaps * gapPx);
	const leads = solid.filter((part) => part.part === 'lead').length;
	const given = solid.map((part, i) => widths[i] + (part.part === 'lead' ? spare / leads : 0));
	return place(chain, given, leads === 0 ? gapPx + spare / gaps : gapPx, broken, width);
}

function partPx({ part }: ChainPart, lines: string[]): number {
	const words = Math.max(...lines.map(textPx));
	if (part === 'pad') return Math.max(34, words);
	return part === 'box' ? words + 12 : Math.max(leastLeadPx, words);
}

function place(
	chain: readonly ChainPart[],
	widths: number[],
	gapPx: number,
	broken: boolean,
	width: number
): ChainLayout {
	const parts: PlacedPart[] = [];
	const wires: ChainLayout['wires'] = [];
	let x = 0;
	let solid = 0;
	for (const [i, part] of chain.entries()) {
		if (part.part === 'plane') {
			const at = solid === 0 ? x : x - gapPx / 2;
			const half = textPx(part.label) / 2;
			parts.push({
				part: 'plane',
				x: at,
				label: part.label,
				textX: Math.min(width - half, Math.max(half, at))
			});
			continue;
		}
		const partWidth = widths[solid];
		const lines = broken ? twoLines(part.label) : [part.label];
		if (part.part === 'box') {
			const branch = part.branch && branchOf(part.branch, x + partWidth / 2, chain[i - 1]?.part === 'plane');
			parts.push({ part: 'box', x, width: partWidth, lines, ...(branch && { branch }) });
		} else parts.push({ part: part.part, x, width: partWidth, lines });
		solid += 1;
		if (solid < widths.length) wires.push({ x0: x + partWidth, x1: x + partWidth + gapPx });
		x += partWidth + gapPx;
	}
	return { parts, wires };
}

/** A branch's words stand where there is more room: before the box's middle, else after it; never across a plane before the box. */
function branchOf(
	label: string,
	boxMiddle: number,
	afterPlane: boolean
): { label: string; x: number; end: 'start' | 'end' } {
	return !afterPlane && boxMiddle > textPx(label) + 30
		? { label, x: boxMiddle - 28, end: 'end' }
		: { label, x: boxMiddle + 28, end: 'start' };
}
