/** Draws traces on a canvas: lines by style, and the ground of a band under its trace. */
import type { PlotFrame } from './plot-frame';
import { traceColumns } from './trace-columns';
import type { TraceStyle } from './trace-style';

export interface DrawnTrace {
	levelsDbm: ArrayLike<number>;
	style: TraceStyle;
}

export interface ShadedBand {
	start: number;
	stop: number;
	/** Index of the trace the band lies under. */
	trace: number;
}

/** Colour of a token, as CSS resolves it for the canvas. */
export type ColourOf = (token: TraceStyle['token']) => string;

/**
 * Clears the canvas and draws everything anew, the first trace on top.
 * @param ratio device pixels a CSS pixel
 */
export function drawTraces(
	canvas: HTMLCanvasElement,
	frame: PlotFrame,
	traces: readonly DrawnTrace[],
	bands: readonly ShadedBand[],
	colourOf: ColourOf,
	ratio: number
): void {
	const context = canvas.getContext('2d');
	if (!context) return;
	fit(canvas, frame, ratio);
	context.setTransform(ratio, 0, 0, ratio, 0, 0);
	context.clearRect(0, 0, frame.width, frame.height);
	context.save();
	context.beginPath();
	context.rect(frame.leftPx, 0, frame.rightPx - frame.leftPx, frame.bottomPx);
	context.clip();
	const lines = traces.map((trace) => traceColumns(trace.levelsDbm, frame));
	for (const band of bands) {
		const line = lines[band.trace];
		if (line) shade(context, frame, line, band, colourOf('verdigris'));
	}
	for (let i = traces.length - 1; i >= 0; i--) stroke(context, lines[i], traces[i].style, colourOf);
	context.restore();
}

function fit(canvas: HTMLCanvasElement, frame: PlotFrame, ratio: number) {
	const width = Math.round(frame.width * ratio);
	const height = Math.round(frame.height * ratio);
	if (canvas.width !== width) canvas.width = width;
	if (canvas.height !== height) canvas.height = height;
}

/**
 * Points stroked at once. One stroke over a whole noisy trace crosses itself a thousand times, and the browser then falls
 * back to a way of filling it that takes several times as long as many short ones.
 */
const pointsAtOnce = 32;

function stroke(
	context: CanvasRenderingContext2D,
	line: Float32Array,
	style: TraceStyle,
	colourOf: ColourOf
) {
	context.strokeStyle = colourOf(style.token);
	context.lineWidth = style.widthPx;
	// A point a pixel: nobody sees how it joins, and the round way costs most of the stroke.
	context.lineJoin = 'bevel';
	context.lineCap = style.cap;
	context.setLineDash([...style.dashPx]);
	const dashed = style.dashPx.length > 0;
	let drawnPx = 0;
	for (let from = 0; from + 2 < line.length; from += 2 * pointsAtOnce) {
		const to = Math.min(line.length - 2, from + 2 * pointsAtOnce);
		context.lineDashOffset = drawnPx;
		context.beginPath();
		context.moveTo(line[from], line[from + 1]);
		for (let i = from + 2; i <= to; i += 2) {
			context.lineTo(line[i], line[i + 1]);
			if (dashed) drawnPx += Math.hypot(line[i] - line[i - 2], line[i + 1] - line[i - 1]);
		}
		context.stroke();
	}
}

function shade(
	context: CanvasRenderingContext2D,
	frame: PlotFrame,
	line: Float32Array,
	band: ShadedBand,
	colour: string
) {
	if (line.length < 4) return;
	const x0 = Math.max(frame.leftPx, frame.x(band.start));
	const x1 = Math.min(frame.rightPx, frame.x(band.stop));
	if (!(x1 > x0)) return;
	context.save();
	context.beginPath();
	context.rect(x0, 0, x1 - x0, frame.bottomPx);
	context.clip();
	context.beginPath();
	context.moveTo(line[0], frame.bottomPx);
	for (let i = 0; i < line.length; i += 2) context.lineTo(line[i], line[i + 1]);
	context.lineTo(line[line.length - 2], frame.bottomPx);
	context.closePath();
	context.globalAlpha = 0.1;
	context.fillStyle = colour;
	context.fill();
	context.restore();
}
