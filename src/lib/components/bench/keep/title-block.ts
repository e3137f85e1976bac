/** The title block under a kept picture: what it shows, how it was set, who, when. */
import type { BenchSnapshot } from './bench-snapshot';
import { figureFont, textFont, type TokenColour } from './picture-pen';
import { setUpLines } from './set-up-lines';
import { showFrequency } from '$lib/units/format-quantity';

export const titleBlockPx = 190;
const edge = 28;

/** Draws the block over `widthPx` from the canvas' present origin down. */
export function drawTitleBlock(
	context: CanvasRenderingContext2D,
	widthPx: number,
	snapshot: BenchSnapshot,
	{ who, at }: { who: string; at: Date },
	colour: TokenColour
): void {
	const right = widthPx - edge;
	const bottom = titleBlockPx - edge;
	const firstX = edge + 360;
	const secondX = right - 270;
	context.strokeStyle = colour('ink');
	context.lineWidth = 1;
	context.strokeRect(edge + 0.5, 0.5, right - edge, bottom);
	context.beginPath();
	for (const x of [firstX, secondX]) {
		context.moveTo(x + 0.5, 0);
		context.lineTo(x + 0.5, bottom);
	}
	context.stroke();
	context.textAlign = 'left';

	context.fillStyle = colour('ink');
	context.font = textFont(18, 620);
	const lines = wrapped(context, snapshot.title, firstX - edge - 32);
	lines.slice(0, 2).forEach((text, i) => context.fillText(text, edge + 16, 30 + i * 22));
	context.font = textFont(13);
	context.fillStyle = colour('pencil');
	const below = 30 + Math.min(2, lines.length) * 22;
	[snapshot.order, snapshot.client, `${snapshot.receiver} receiver`].forEach((text, i) =>
		context.fillText(text, edge + 16, below + 4 + i * 20)
	);

	setUpLines(snapshot.resolved).forEach(({ label, text }, i) => {
		const y = 26 + i * 24;
		context.fillStyle = colour('pencil');
		context.font = textFont(12);
		context.fillText(label, firstX + 16, y);
		context.fillStyle = colour('ink');
		context.fillText(fitted(context, text, secondX - firstX - 90), firstX + 74, y);
	});

	context.fillStyle = colour('ink');
	context.font = textFont(13, 560);
	context.fillText(fitted(context, who, right - secondX - 32), secondX + 16, 26);
	context.font = figureFont(12);
	context.fillText(localTime(at), secondX + 16, 48);
	context.font = figureFont(12);
	snapshot.markers.slice(0, 3).forEach(({ letter, at: place, levelDbm }, i) => {
		const { figure, unit } =
			snapshot.axis.kind === 'time' ? { figure: (place * 1e3).toFixed(3), unit: 'ms' } : showFrequency(place);
		const text = `${letter} ${levelDbm.toFixed(1).replace('-', '−')} dBm, ${figure} ${unit}`;
		context.fillText(fitted(context, text, right - secondX - 32), secondX + 16, 72 + i * 18);
	});
	context.fillStyle = colour('pencil');
	context.font = textFont(12);
	context.fillText('Simulated signal:', secondX + 16, bottom - 26);
	context.fillText('not an authorisation to work', secondX + 16, bottom - 10);
}

const localTime = (at: Date) =>
	at.toLocaleString('en-GB', {
		day: 'numeric',
		month: 'short',
		year: 'numeric',
		hour: '2-digit',
		minute: '2-digit'
	});

function wrapped(context: CanvasRenderingContext2D, text: string, widthPx: number): string[] {
	const lines = [''];
	for (const word of text.split(' ')) {
		const longer = `${lines[lines.length - 1]} ${word}`.trim();
		if (context.measureText(longer).width <= widthPx || lines[lines.length - 1] === '')
			lines[lines.length - 1] = longer;
		else lines.push(word);
	}
	return lines;
}

/** The text, shortened to fit. */
function fitted(context: CanvasRenderingContext2D, text: string, widthPx: number): string {
	if (context.measureText(text).width <= widthPx) return text;
	let shorter = text;
	while (shorter.length > 1 && context.measureText(`${shorter}…`).width > widthPx)
		shorter = shorter.slice(0, -1);
	return `${shorter}…`;
}
