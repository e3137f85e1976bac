import PDFDocument from 'pdfkit';
import type { EntryView } from '$lib/schemas/logbook';
import { drawPlot } from './draw-plot';
import { stretchesOf, typeCuts } from './type';

/** A4 and its margin, pt. */
const MARGIN = 48;
const INK = '#17202A';
const PENCIL = '#5C6670';
const PLOT_HEIGHT = 190;

export type DocumentEntry = EntryView & { receiver: string };

/** Entries of a logbook as an A4 document in PDF, the type embedded. */
export async function logbookDocument(
	entries: readonly DocumentEntry[],
	{ who, at }: { who: string; at: Date }
): Promise<Buffer> {
	const document = new PDFDocument({
		size: 'A4',
		margin: MARGIN,
		info: { Title: 'Logbook', Author: who, Creator: 'Sweepwright', CreationDate: at },
		lang: 'en-GB'
	});
	const done = collected(document);
	const { text, bold, extended } = typeCuts();
	document.registerFont('text', text).registerFont('bold', bold).registerFont('extended', extended);
	const width = document.page.width - 2 * MARGIN;

	const write = (
		words: string,
		left: number,
		top: number,
		options: { width?: number; align?: 'right' | 'center' } = {}
	) => {
		document.font('text').fontSize(7.5).fillColor(PENCIL);
		document.text(
			stretchesOf(words)
				.map((stretch) => stretch.text)
				.join(''),
			left,
			top,
			{ ...options, lineBreak: false }
		);
	};
	/** A paragraph below what stands there. */
	const say = (words: string, size: number, colour = INK, face: 'text' | 'bold' = 'text') => {
		const stretches = stretchesOf(words);
		document.fontSize(size).fillColor(colour);
		stretches.forEach((stretch, i) =>
			document
				.font(stretch.extended ? 'extended' : face)
				.text(stretch.text, { width, continued: i < stretches.length - 1 })
		);
	};

	document.x = MARGIN;
	say('Logbook', 20, INK, 'bold');
	say(`${who}, ${dayOf(at)}. Simulated signals: not an authorisation to work.`, 9, PENCIL);
	for (const entry of entries) {
		const needed = entry.picture ? PLOT_HEIGHT + 130 : 130;
		if (document.y + needed > document.page.height - MARGIN) document.addPage();
		document.moveDown(1);
		document
			.moveTo(MARGIN, document.y)
			.lineTo(MARGIN + width, document.y)
			.lineWidth(0.7)
			.stroke(INK);
		document.moveDown(0.4);
		document.x = MARGIN;
		const value = entry.value ? `: ${entry.value.figure} ${entry.value.unit}`.trimEnd() : '';
		const spread = entry.spread ? ` ${entry.spread}` : '';
		say(`${entry.what.charAt(0).toUpperCase()}${entry.what.slice(1)}${value}${spread}`, 12, INK, 'bold');
		say(
			`Exercise ${entry.exercise.place}, ${entry.exercise.title}; attempt ${entry.attempt.number}; kept ${dayOf(new Date(entry.keptAt))}`,
			9,
			PENCIL
		);
		if (entry.picture) {
			const top = document.y + 6;
			drawPlot(
				document,
				{ picture: entry.picture, resolved: entry.resolved },
				{ left: MARGIN, top, width, height: PLOT_HEIGHT },
				write
			);
			document.x = MARGIN;
			document.y = top + PLOT_HEIGHT + 4;
		}
		document.moveDown(0.3);
		for (const line of entry.setUp) say(`${line.label}: ${line.text}`, 9);
		say(`Receiver: ${entry.receiver}`, 9);
		for (const remark of entry.remarks) say(remark, 9, PENCIL);
		if (entry.note) {
			document.moveDown(0.3);
			say(entry.note, 10);
		}
	}
	document.end();
	return done;
}

const dayOf = (at: Date): string =>
	`${at.toLocaleString('en-GB', { day: 'numeric', month: 'long', year: 'numeric', hour: '2-digit', minute: '2-digit', timeZone: 'UTC' })} UTC`;

function collected(document: InstanceType<typeof PDFDocument>): Promise<Buffer> {
	return new Promise((resolve, reject) => {
		const chunks: Buffer[] = [];
		document.on('data', (chunk: Buffer) => chunks.push(chunk));
		document.on('end', () => resolve(Buffer.concat(chunks)));
		document.on('error', reject);
	});
}
