interface Box {
	left: number;
	top: number;
	bottom: number;
	width: number;
	height: number;
}
/** Between the word and its note, and between the note and the edge of the window, px. */
const GAP = 6;
const EDGE = 12;

/** Where a note stands: under its word, over it where there is no room below, and always within the window. All in px. */
export function placeNote(
	word: Pick<Box, 'left' | 'top' | 'bottom'>,
	note: Pick<Box, 'width' | 'height'>,
	window: Pick<Box, 'width' | 'height'>
): { left: number; top: number } {
	const below = word.bottom + GAP;
	const fits = below + note.height <= window.height - EDGE;
	const above = word.top - GAP - note.height;
	return {
		left: Math.max(EDGE, Math.min(word.left, window.width - note.width - EDGE)),
		top: fits || above < EDGE ? below : above
	};
}
