/** A mask's line and the band of hatching above it, 10 px square to the line, for the segments that touch the window. */
import type { MaskLimits } from '$lib/schemas/reading';
import type { PlotFrame } from './plot-frame';

const bandPx = 10;

export interface MaskPath {
	/** The limit itself; steps between neighbours that touch are drawn. */
	line: string;
	/** One area for each segment. */
	bands: { d: string }[];
}

export function maskPath(limits: MaskLimits, frame: PlotFrame): MaskPath {
	const inside = limits
		.filter(({ startHz, stopHz }) => stopHz > frame.start && startHz < frame.stop)
		.sort((a, b) => a.startHz - b.startHz)
		.map(({ startHz, stopHz, levelDbm }) => ({
			x0: Math.max(frame.leftPx, frame.x(startHz)),
			x1: Math.min(frame.rightPx, frame.x(stopHz)),
			y: Math.min(frame.bottomPx, Math.max(frame.topPx, frame.y(levelDbm)))
		}));
	const line = inside.map(({ x0, x1, y }, i) => {
		const joins = i > 0 && Math.abs(x0 - inside[i - 1].x1) < 0.5;
		return `${joins ? 'L' : 'M'}${x0} ${y}H${x1}`;
	});
	const bands = inside.map(({ x0, x1, y }) => ({ d: `M${x0} ${y}H${x1}v${-bandPx}H${x0}Z` }));
	return { line: line.join(''), bands };
}
