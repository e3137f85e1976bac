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
export const characterPx = 6.5;
const wirePx = 18;
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
	const wires = Math.max(0, solid.length - 1) * wirePx;
	const measure = (broken: boolean) =>
		solid.map((part) => {
			const lines = broken ? twoLines(part.label) : [part.label];
			const words = Math.max(...lines.map(textPx));
			return part.part === 'box' ? words + 12 : part.part === 'pad' ? 34 : Math.max(leastLeadPx, words);
		});
	const total = (widths: number[]) => widths.reduce((sum, w) => sum + w, wires);
	const whole = measure(false);
	const broken = total(whole) > width;
	const widths = broken ? measure(true) : whole;
	const spare = Math.max(0, width - total(widths));
	const stretched = solid.filter((part) => part.part === 'lead').length;
	const given = solid.map((part, i) => widths[i] + (part.part === 'lead' ? spare / stretched : 0));
	const gapPx = wirePx + (stretched === 0 && solid.length > 1 ? spare / (solid.length - 1) : 0);
	return place(chain, given, gapPx, broken, width);
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
	for (const part of chain) {
		if (part.part === 'plane') {
			const at = solid === 0 ? x : x - gapPx / 2;
			const half = textPx(planeText) / 2;
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
			const branch = part.branch && branchOf(part.branch, x + partWidth / 2);
			parts.push({ part: 'box', x, width: partWidth, lines, ...(branch && { branch }) });
		} else parts.push({ part: part.part, x, width: partWidth, lines });
		solid += 1;
		if (solid < widths.length) wires.push({ x0: x + partWidth, x1: x + partWidth + gapPx });
		x += partWidth + gapPx;
	}
	return { parts, wires };
}

export const planeText = 'answer for this plane';

/** A branch's words stand where there is more room: before the box's middle, else after it. */
function branchOf(label: string, boxMiddle: number): { label: string; x: number; end: 'start' | 'end' } {
	return boxMiddle > textPx(label) + 30
		? { label, x: boxMiddle - 28, end: 'end' }
		: { label, x: boxMiddle + 28, end: 'start' };
}
