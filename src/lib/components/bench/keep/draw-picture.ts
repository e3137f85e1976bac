/** The plot as a picture to keep: axis, traces, markers, brackets, and a title block like a drawing's. */
import { bandGeometry } from '../plot/band-geometry';
import { bandStacks } from '../plot/band-stacks';
import { drawTraces, type ColourOf } from '../plot/draw-traces';
import { flagPx, placeFlags } from '../plot/flag-layout';
import { frequencyAxis } from '../plot/frequency-axis';
import { levelLines } from '../levels/level-lines';
import { levelWindow } from '../plot/level-axis';
import { plotFrame, type PlotFrame } from '../plot/plot-frame';
import { traceStyle } from '../plot/trace-style';
import type { BenchSnapshot } from './bench-snapshot';
import { figureFont, textFont, type TokenColour } from './picture-pen';
import { drawTitleBlock, titleBlockPx } from './title-block';

const size = { width: 1200, height: 560 };
const ratio = 2;
/** Draws the picture on a canvas, made as large as it takes: 1200 px wide at two device pixels each. */
export function drawPicture(
	canvas: HTMLCanvasElement,
	snapshot: BenchSnapshot,
	block: { who: string; at: Date },
	colour: TokenColour
): void {
	canvas.width = size.width * ratio;
	canvas.height = (size.height + titleBlockPx) * ratio;
	const context = canvas.getContext('2d');
	if (!context) throw new Error('This browser draws no pictures.');
	context.scale(ratio, ratio);
	context.fillStyle = colour('sheet');
	context.fillRect(0, 0, size.width, size.height + titleBlockPx);
	const { axis, resolved } = snapshot;
	const window = levelWindow(resolved.referenceDbm);
	const frame = plotFrame(size, { top: 52, right: 28, bottom: 40, left: 64 }, { ...axis, ...window });
	drawGround(context, frame, snapshot, colour);
	const traces = snapshot.traces.map(({ levelsDbm }, i) => ({ levelsDbm, style: traceStyle(i) }));
	const layer = document.createElement('canvas');
	drawTraces(layer, frame, traces, snapshot.bands, colour as ColourOf, ratio);
	context.drawImage(layer, 0, 0, size.width, size.height);
	drawLegend(context, frame, snapshot, colour);
	drawBands(context, frame, snapshot, colour);
	drawMarkers(context, frame, snapshot, colour);
	context.translate(0, size.height);
	drawTitleBlock(context, size.width, snapshot, block, colour);
}

type Pen = CanvasRenderingContext2D;

function line(context: Pen, x0: number, y0: number, x1: number, y1: number) {
	context.beginPath();
	context.moveTo(x0, y0);
	context.lineTo(x1, y1);
	context.stroke();
}

function drawGround(context: Pen, frame: PlotFrame, { axis, resolved }: BenchSnapshot, colour: TokenColour) {
	context.lineWidth = 1;
	context.strokeStyle = colour('grid');
	context.fillStyle = colour('pencil');
	context.font = figureFont(12);
	context.textAlign = 'right';
	for (const { levelDbm, figure } of levelLines(resolved.referenceDbm, frame.topDbm, frame.bottomDbm)) {
		const y = Math.round(frame.y(levelDbm)) + 0.5;
		line(context, frame.leftPx, y, frame.rightPx, y);
		context.fillText(figure, frame.leftPx - 8, y + 4);
	}
	context.strokeStyle = colour('line');
	line(context, frame.leftPx, frame.bottomPx + 0.5, frame.rightPx, frame.bottomPx + 0.5);
	const rule = frequencyAxis(axis, frame.leftPx, frame.rightPx);
	context.textAlign = 'center';
	for (const { px, long, figure } of rule.ticks) {
		line(context, px, frame.bottomPx, px, frame.bottomPx + (long ? 6 : 3));
		if (figure) context.fillText(figure, px, frame.bottomPx + 20);
	}
	context.font = textFont(12);
	context.textAlign = 'right';
	context.fillText(rule.unit, frame.rightPx, frame.bottomPx + 20);
	context.fillText('dBm', frame.leftPx - 8, frame.y(resolved.referenceDbm) - 14);
}

function drawLegend(context: Pen, frame: PlotFrame, { traces, sweep }: BenchSnapshot, colour: TokenColour) {
	context.font = textFont(13);
	context.textAlign = 'left';
	let x = frame.leftPx;
	traces.forEach(({ words }, i) => {
		const style = traceStyle(i);
		context.strokeStyle = colour(style.token);
		context.lineWidth = style.widthPx;
		context.setLineDash([...style.dashPx]);
		line(context, x, 20, x + 26, 20);
		context.setLineDash([]);
		context.fillStyle = colour('ink');
		context.fillText(words, x + 34, 24);
		x += 34 + context.measureText(words).width + 24;
	});
	context.textAlign = 'right';
	context.fillStyle = colour('pencil');
	context.fillText(sweep, frame.rightPx, 24);
}

/** Text on a halo of the sheet, so that it is read over traces. */
function haloed(context: Pen, text: string, x: number, y: number, fill: string, sheet: string) {
	context.lineWidth = 5;
	context.lineJoin = 'round';
	context.strokeStyle = sheet;
	context.strokeText(text, x, y);
	context.fillStyle = fill;
	context.fillText(text, x, y);
}

/** How wide a band’s figure and what stands under it may be. */
const figureWidthPx = 140;

function drawBands(context: Pen, frame: PlotFrame, { bands }: BenchSnapshot, colour: TokenColour) {
	const stacks = bandStacks(bands, frame, figureWidthPx);
	bands.forEach((band, i) => {
		const geometry = bandGeometry(band, frame, stacks[i], figureWidthPx);
		if (!geometry) return;
		const { x0, x1, startInside, stopInside, dimensionY: y, figureX } = geometry;
		const edges = [...(startInside ? [x0] : []), ...(stopInside ? [x1] : [])];
		context.lineWidth = 1;
		context.strokeStyle = colour('pencil');
		context.setLineDash([3, 3]);
		for (const x of edges) line(context, x, y - 44, x, frame.bottomPx);
		context.setLineDash([]);
		context.strokeStyle = colour('verdigris');
		context.lineWidth = 1.25;
		line(context, x0 - (startInside ? 6 : 0), y, x1 + (stopInside ? 6 : 0), y);
		context.lineWidth = 1.6;
		for (const x of edges) line(context, x - 4, y + 4, x + 4, y - 4);
		context.textAlign = 'center';
		context.font = figureFont(20, 600);
		haloed(context, `${band.figure} ${band.unit}`, figureX, y - 11, colour('verdigris'), colour('sheet'));
		context.font = textFont(12);
		haloed(context, band.what, figureX, y + 18, colour('pencil'), colour('sheet'));
	});
}

function drawMarkers(context: Pen, frame: PlotFrame, { markers, axis }: BenchSnapshot, colour: TokenColour) {
	const inside = markers.filter(({ at }) => at >= axis.start && at <= axis.stop);
	const feet = inside.map(({ at, levelDbm }) => ({
		x: frame.x(at),
		y: Math.max(frame.topPx + 18, Math.min(frame.bottomPx, frame.y(levelDbm)))
	}));
	placeFlags(feet, frame).forEach(({ x, y, stem, side }, i) => {
		const sign = side === 'right' ? 1 : -1;
		const { width, height } = flagPx;
		const top = y - stem;
		context.lineWidth = 1.25;
		context.strokeStyle = colour('ink');
		context.fillStyle = colour('sheet');
		line(context, x, y - 2.6, x, top);
		const cloth = new Path2D(
			`M${x} ${top}h${sign * width}L${x + sign * (width - 5)} ${top + height / 2}L${x + sign * width} ${top + height}H${x}Z`
		);
		context.fill(cloth);
		context.stroke(cloth);
		const foot = new Path2D();
		foot.arc(x, y, 2.6, 0, 2 * Math.PI);
		context.fill(foot);
		context.stroke(foot);
		context.fillStyle = colour('ink');
		context.font = textFont(11.5, 650);
		context.textAlign = 'center';
		context.fillText(inside[i].letter, x + sign * 6.5, top + height / 2 + 4);
	});
}
