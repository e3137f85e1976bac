/** The scale rule under a plot: where its ticks stand, and what is written at the long ones. */
import { formatFigure } from '$lib/units/format-quantity';

export interface AxisTick {
	/** px from the left. */
	px: number;
	long: boolean;
	/** Written under a long tick; absent where it would touch its neighbour or the unit. */
	figure?: string;
}

export interface FrequencyAxis {
	unit: 'Hz' | 'kHz' | 'MHz' | 'GHz' | 's' | 'ms' | 'µs';
	ticks: AxisTick[];
}

const frequencyUnits = [
	{ unit: 'GHz', hz: 1e9 },
	{ unit: 'MHz', hz: 1e6 },
	{ unit: 'kHz', hz: 1e3 },
	{ unit: 'Hz', hz: 1 }
] as const;
const timeUnits = [
	{ unit: 's', hz: 1 },
	{ unit: 'ms', hz: 1e-3 },
	{ unit: 'µs', hz: 1e-6 }
] as const;
/** Minor ticks between two long ones, by the long step's leading digit. */
const minorsFor: Record<number, number> = { 1: 10, 2: 4, 5: 5 };
/** Width of one character of a 12 px monospaced axis figure, and the least gap between figures, px. */
const characterPx = 7.3;
const gapPx = 14;
/** Long ticks stand at least this far apart: closer on a narrow plot, which would have none else, px. */
const leastStepPx = (widthPx: number) => (widthPx < 500 ? 60 : 110);

/** The 1-2-5 step nearest above `least`. */
export function niceStep(least: number): { step: number; leading: 1 | 2 | 5 } {
	const decade = 10 ** Math.floor(Math.log10(least) + 1e-9);
	for (const leading of [1, 2, 5] as const)
		if (leading * decade >= least * (1 - 1e-9)) return { step: leading * decade, leading };
	return { step: 10 * decade, leading: 1 };
}

/**
 * Ticks from `start` to `stop` (Hz, or s for level over time) along `leftPx` … `rightPx`. The unit stands at the right end
 * in place of the last figure; figures that would touch are dropped, every other one, never shrunk.
 */
export function frequencyAxis(
	range: { start: number; stop: number; kind?: 'frequency' | 'time' },
	leftPx: number,
	rightPx: number
): FrequencyAxis {
	const { start, stop } = range;
	const span = stop - start;
	const units = range.kind === 'time' ? timeUnits : frequencyUnits;
	const largest = Math.max(Math.abs(start), Math.abs(stop));
	const { unit, hz } = units.find((u) => largest >= u.hz) ?? units[units.length - 1];
	if (!(span > 0)) return { unit, ticks: [] };
	const widthPx = rightPx - leftPx;
	const { step, leading } = niceStep((span * leastStepPx(widthPx)) / widthPx);
	const decimals = Math.max(0, Math.ceil(-Math.log10(step / hz) - 1e-9));
	const minors = minorsFor[leading];
	const minorStep = step / minors;
	const ticks: AxisTick[] = [];
	for (let n = Math.ceil(start / minorStep - 1e-6); n * minorStep <= stop + minorStep * 1e-6; n++) {
		const px = leftPx + ((n * minorStep - start) / span) * widthPx;
		const long = n % minors === 0;
		ticks.push(long ? { px, long, figure: formatFigure((n * minorStep) / hz, decimals) } : { px, long });
	}
	return { unit, ticks: withoutCollisions(ticks, leftPx, rightPx - unit.length * characterPx) };
}

/** Takes away the figures that reach over the ends, over the unit or into each other. */
function withoutCollisions(ticks: AxisTick[], leftPx: number, unitPx: number): AxisTick[] {
	const half = (tick: AxisTick) => ((tick.figure ?? '').length * characterPx) / 2;
	const fits = ticks.map((tick) =>
		tick.figure && tick.px + half(tick) + gapPx / 2 > unitPx ? { px: tick.px, long: tick.long } : tick
	);
	const figured = fits.filter((tick) => tick.figure);
	const touching = figured.some(
		(tick, i) => i > 0 && tick.px - half(tick) - (figured[i - 1].px + half(figured[i - 1])) < gapPx
	);
	const kept = new Set(
		figured.filter((tick, i) => (!touching || i % 2 === 0) && tick.px - half(tick) > leftPx - 30)
	);
	return fits.map((tick) => (tick.figure && !kept.has(tick) ? { px: tick.px, long: tick.long } : tick));
}
