/** A picture of traces drawn as lines in a document: level lines, a scale rule below, no frame. */
import type { EntryView } from '$lib/schemas/logbook';
import { formatFigure, formatFrequency, formatTime } from '$lib/units/format-quantity';
import type PDFDocument from 'pdfkit';

type Document = InstanceType<typeof PDFDocument>;

/** Shown below the reference level, dB; level lines stand this far apart. */
const RANGE_DB = 100;
const STEP_DB = 20;
const STYLES = [
	{ colour: '#1F4E79', width: 0.9, dash: null },
	{ colour: '#A63D40', width: 0.7, dash: [4, 2] },
	{ colour: '#2E6F67', width: 1, dash: [7, 3] },
	{ colour: '#6B4C7A', width: 1, dash: [1, 2] }
] as const;

/**
 * @param write sets a line of text at a place
 * @param place of the drawing with its figures, pt
 */
export function drawPlot(
	document: Document,
	{ picture, resolved }: Pick<EntryView, 'resolved'> & { picture: NonNullable<EntryView['picture']> },
	place: { left: number; top: number; width: number; height: number },
	write: (
		text: string,
		left: number,
		top: number,
		options?: { width?: number; align?: 'right' | 'center' }
	) => void
): void {
	const box = {
		left: place.left + 34,
		top: place.top + 6,
		width: place.width - 36,
		height: place.height - 26
	};
	const y = (levelDbm: number) =>
		box.top + (Math.min(RANGE_DB, Math.max(0, resolved.referenceDbm - levelDbm)) / RANGE_DB) * box.height;
	for (let below = 0; below <= RANGE_DB; below += STEP_DB) {
		const level = resolved.referenceDbm - below;
		document
			.moveTo(box.left, y(level))
			.lineTo(box.left + box.width, y(level))
			.lineWidth(0.5)
			.undash()
			.stroke('#C9C4B6');
		write(`${formatFigure(level, 0)}${below === 0 ? ' dBm' : ''}`, place.left - 8, y(level) - 5, {
			width: 38,
			align: 'right'
		});
	}
	picture.traces.forEach(({ levelsDbm }, index) => {
		if (levelsDbm.length < 2) return;
		const { colour, width, dash } = STYLES[index % STYLES.length];
		levelsDbm.forEach((level, i) => {
			const x = box.left + (i / (levelsDbm.length - 1)) * box.width;
			if (i === 0) document.moveTo(x, y(level));
			else document.lineTo(x, y(level));
		});
		document.lineWidth(width).lineJoin('round');
		if (dash) document.dash(dash[0], { space: dash[1] });
		else document.undash();
		document.stroke(colour);
	});
	document.undash();
	const overTime = resolved.spanHz === 0;
	const bottom = box.top + box.height;
	document
		.moveTo(box.left, bottom)
		.lineTo(box.left + box.width, bottom)
		.lineWidth(0.8)
		.stroke('#17202A');
	const ends = overTime ? [0, resolved.sweepTimeS] : [resolved.startHz, resolved.stopHz];
	for (const share of [0, 0.5, 1]) {
		const value = ends[0] + share * (ends[1] - ends[0]);
		const x = box.left + share * box.width;
		document
			.moveTo(x, bottom)
			.lineTo(x, bottom + 5)
			.stroke('#17202A');
		write(
			overTime ? formatTime(Number(value.toPrecision(6))) : formatFrequency(Math.round(value)),
			x - 60 * share * 2,
			bottom + 7,
			{
				width: 120,
				align: share === 0 ? undefined : share === 1 ? 'right' : 'center'
			}
		);
	}
}
