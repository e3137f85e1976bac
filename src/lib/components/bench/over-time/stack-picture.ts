/** Sweeps stacked on a canvas, newest on top. A new sweep shifts the picture down and draws one line. */
import type { KeptRow } from '../state/trace-set.svelte';
import { stackRow } from './stack-row';

export interface StackLook {
	widthPx: number;
	heightPx: number;
	/** Height of one sweep, px. */
	rowPx: number;
	topDbm: number;
	bottomDbm: number;
	/** The ink, as any CSS colour of six hexadecimal digits. */
	ink: string;
	/** Device pixels a CSS pixel. */
	ratio: number;
}

export class StackPicture {
	readonly #canvas: HTMLCanvasElement;
	#look = '';
	#first: KeptRow | undefined;
	#newest: number | undefined;

	constructor(canvas: HTMLCanvasElement) {
		this.#canvas = canvas;
	}

	/** Brings the picture up to these rows: by the lines that are new, or whole where anything else changed. */
	show(rows: readonly KeptRow[], look: StackLook): void {
		const context = this.#canvas.getContext('2d', { willReadFrequently: false });
		if (!context) return;
		const width = Math.round(look.widthPx * look.ratio);
		const height = Math.round(look.heightPx * look.ratio);
		const line = Math.max(1, Math.round(look.rowPx * look.ratio));
		const most = Math.ceil(height / line);
		const same = this.#look === JSON.stringify(look) && this.#goesOn(rows);
		const fresh = same ? newerThan(rows, this.#newest ?? -1) : rows;
		if (!same) {
			this.#canvas.width = width;
			this.#canvas.height = height;
			this.#look = JSON.stringify(look);
		}
		const drawn = fresh.slice(-most);
		if (same && drawn.length > 0) {
			context.globalCompositeOperation = 'copy';
			context.drawImage(this.#canvas, 0, drawn.length * line);
			context.globalCompositeOperation = 'source-over';
		}
		drawn.toReversed().forEach(({ levelsDbm }, i) => {
			context.putImageData(lineOf(levelsDbm, width, line, look), 0, i * line);
		});
		this.#first = rows[0];
		this.#newest = rows.at(-1)?.row;
	}

	/** Whether these rows hold those shown and perhaps more: nothing restarted, nothing was gone back to. */
	#goesOn(rows: readonly KeptRow[]): boolean {
		const last = rows.at(-1);
		if (!last || this.#newest === undefined || last.row < this.#newest) return false;
		return rows[0] === this.#first || rows[0].row <= this.#newest;
	}
}

/** The rows after `row`, without looking at all the others. */
function newerThan(rows: readonly KeptRow[], row: number): readonly KeptRow[] {
	let from = rows.length;
	while (from > 0 && rows[from - 1].row > row) from--;
	return rows.slice(from);
}

function lineOf(levelsDbm: Float32Array, width: number, line: number, look: StackLook): ImageData {
	const ink = stackRow(levelsDbm, width, look);
	const image = new ImageData(width, line);
	const [red, green, blue] = [1, 3, 5].map((at) => parseInt(look.ink.slice(at, at + 2), 16));
	for (let y = 0; y < line; y++) {
		for (let x = 0; x < width; x++) {
			const at = 4 * (y * width + x);
			image.data[at] = red;
			image.data[at + 1] = green;
			image.data[at + 2] = blue;
			image.data[at + 3] = ink[x];
		}
	}
	return image;
}
