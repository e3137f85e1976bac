/** The markers of a bench: A to H, where each stands, which one is selected. */

import { markerLetters, type Markings } from '$lib/schemas/markings';

/** `at` is its place on the axis; one that follows something goes on following until it is moved by hand. */
export type Marker = Markings['markers'][number];

export class MarkerList {
	list = $state.raw<readonly Marker[]>([]);
	selectedLetter = $state<string | undefined>();
	readonly selected = $derived(this.list.find((marker) => marker.letter === this.selectedLetter));
	readonly full = $derived(this.list.length >= markerLetters.length);

	/** Puts markers back as they stood. */
	restore({ markers, selected }: Pick<Markings, 'markers' | 'selected'>): void {
		this.list = markers;
		this.selectedLetter = selected ?? undefined;
	}

	/** Adds a marker under the first free letter and selects it. @returns undefined when all eight stand */
	add(at: number, options: Pick<Marker, 'follows' | 'from'> & { trace?: number } = {}): Marker | undefined {
		const letter = markerLetters.find((l) => !this.list.some((marker) => marker.letter === l));
		if (!letter) return undefined;
		const marker: Marker = { letter, at, trace: options.trace ?? 1 };
		if (options.from) marker.from = options.from;
		if (options.follows) marker.follows = options.follows;
		this.list = [...this.list, marker].sort((a, b) => a.letter.localeCompare(b.letter));
		this.selectedLetter = letter;
		return marker;
	}

	find(letter: string | undefined): Marker | undefined {
		return this.list.find((marker) => marker.letter === letter);
	}

	/** Moves a marker; it no longer follows anything. */
	move(letter: string, at: number): void {
		this.#change(letter, ({ follows: _, ...marker }) => ({ ...marker, at }));
	}

	/** Puts a following marker where its point is now. */
	keepAt(letter: string, at: number): void {
		this.#change(letter, (marker) => ({ ...marker, at }));
	}

	/** Reads `letter` from another marker, or absolutely again when `from` is undefined. */
	readFrom(letter: string, from: string | undefined): void {
		const other = from === letter ? undefined : this.find(from);
		this.#change(letter, ({ from: _, ...marker }) => (other ? { ...marker, from: other.letter } : marker));
	}

	standOn(letter: string, trace: number): void {
		this.#change(letter, (marker) => ({ ...marker, trace }));
	}

	select(letter: string | undefined): void {
		this.selectedLetter = letter;
	}

	/** Takes a marker away; those read from it become absolute. */
	remove(letter: string): void {
		this.list = this.list
			.filter((marker) => marker.letter !== letter)
			.map((marker) => {
				if (marker.from !== letter) return marker;
				const { from: _, ...absolute } = marker;
				return absolute;
			});
		if (this.selectedLetter === letter) this.selectedLetter = this.list.at(-1)?.letter;
	}

	#change(letter: string, change: (marker: Marker) => Marker): void {
		this.list = this.list.map((marker) => (marker.letter === letter ? change(marker) : marker));
	}
}
