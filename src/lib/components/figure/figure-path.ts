/** A figure's traces as paths of a drawing: the same on the server as on the page. */
import type { FigureState } from '$lib/schemas/figure-view';
import type { PlotFrame } from '../bench/plot/plot-frame';
import { traceColumns } from '../bench/plot/trace-columns';

/** The axis of a state: frequency, or in span 0 time from the sweep's beginning. */
export function axisOf({ resolved }: FigureState): {
	kind: 'frequency' | 'time';
	start: number;
	stop: number;
} {
	const { startHz, stopHz, spanHz, sweepTimeS } = resolved;
	return spanHz > 0
		? { kind: 'frequency', start: startHz, stop: stopHz }
		: { kind: 'time', start: 0, stop: sweepTimeS };
}

/** The part of `frame` that a state's levels lie over: another span than the frame's is drawn where it belongs. */
function placed(frame: PlotFrame, state: FigureState): PlotFrame {
	const { start, stop } = axisOf(state);
	return { ...frame, leftPx: frame.x(start), rightPx: frame.x(stop) };
}

const pathOf = (line: Float32Array): string => {
	let path = '';
	for (let i = 0; i < line.length; i += 2)
		path += `${i ? 'L' : 'M'}${line[i].toFixed(1)} ${line[i + 1].toFixed(1)}`;
	return path;
};

/** The line of a state's trace. */
export const tracePath = (frame: PlotFrame, state: FigureState, trace: number): string =>
	pathOf(traceColumns(state.traces[trace].levelsDbm, placed(frame, state)));

/** What lies between the first trace and the axis. */
export function groundPath(frame: PlotFrame, state: FigureState): string {
	const line = traceColumns(state.traces[0].levelsDbm, placed(frame, state));
	if (line.length < 4) return '';
	return `${pathOf(line)}V${frame.bottomPx}H${line[0].toFixed(1)}Z`;
}
