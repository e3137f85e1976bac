/** Seconds ago at the left of the stacked picture. */
import { formatFigure } from '$lib/units/format-quantity';
import { niceStep } from '../plot/frequency-axis';
import type { KeptRow } from '../state/trace-set.svelte';

export interface AgeTick {
	/** px from the top of the picture. */
	px: number;
	figure: string;
}

/** Figures stand at least this far apart, px. */
const leastPx = 44;

/**
 * Ticks at round ages. Sweeps stand one under another whatever time lay between them, so each tick stands where the
 * sweeps reach its age.
 * @param rows oldest first; @param rowPx height of one sweep; @param heightPx of the picture
 */
export function ageTicks(rows: readonly KeptRow[], rowPx: number, heightPx: number): AgeTick[] {
	const shown = rows.slice(-Math.ceil(heightPx / rowPx));
	if (shown.length < 2) return [];
	const newest = shown[shown.length - 1].clockS;
	const wholeS = newest - shown[0].clockS;
	if (!(wholeS > 0)) return [];
	const { step } = niceStep((wholeS * leastPx) / (shown.length * rowPx));
	const decimals = Math.max(0, Math.ceil(-Math.log10(step) - 1e-9));
	const ticks: AgeTick[] = [];
	let due = 0;
	for (let i = shown.length - 1, place = 0; i >= 0; i--, place++) {
		const age = newest - shown[i].clockS;
		if (age < due * step - 1e-9) continue;
		const px = place * rowPx;
		if (ticks.length === 0 || px - ticks[ticks.length - 1].px >= leastPx * 0.6) {
			ticks.push({ px, figure: formatFigure(due * step, decimals) });
		}
		due = Math.floor(age / step + 1e-9) + 1;
	}
	return ticks;
}
