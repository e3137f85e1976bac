/** The keys of the plot: what each does, for the plot itself and for the sheet that lists them. */
import type { Bench } from './state/bench.svelte';

export const keyList: readonly { keys: string; does: string }[] = [
	{ keys: '← →', does: 'move the marker by one point of the trace; with Shift by ten' },
	{ keys: 'P', does: 'to the highest point' },
	{ keys: ', and .', does: 'to the next peak on the left, on the right' },
	{ keys: 'M', does: 'another marker' },
	{ keys: 'A to H', does: 'select that marker, if it stands' },
	{ keys: 'Space', does: 'say the marker’s frequency and level' },
	{ keys: 'Delete', does: 'take the marker away' },
	{ keys: 'R', does: 'run or stop' }
];

/**
 * Does what a key on the plot asks for. `letter` is the marker in focus; without one the selected marker is meant.
 * @returns true when the key meant something here
 */
export function pressPlotKey(
	bench: Bench,
	event: KeyboardEvent,
	letter = bench.markers.selectedLetter
): boolean {
	if (event.ctrlKey || event.metaKey || event.altKey) return false;
	const marker = bench.markers.find(letter);
	const points = event.shiftKey ? 10 : 1;
	switch (event.key) {
		case 'm':
			bench.addMarker();
			return true;
		case 'r':
			bench.toggle();
			return true;
	}
	const named = event.key.toUpperCase();
	if (bench.markers.find(named)) {
		bench.markers.select(named);
		return true;
	}
	if (!marker) return false;
	switch (event.key) {
		case 'ArrowLeft':
		case 'ArrowRight': {
			const sign = event.key === 'ArrowLeft' ? -1 : 1;
			bench.moveMarker(marker.letter, marker.at + sign * points * bench.pointStep);
			return true;
		}
		case 'Home':
			bench.moveMarker(marker.letter, bench.axis.start);
			return true;
		case 'End':
			bench.moveMarker(marker.letter, bench.axis.stop);
			return true;
		case 'p':
			bench.toPeak(marker.letter, 'highest');
			return true;
		case ',':
		case '.':
			bench.toPeak(marker.letter, event.key === ',' ? 'left' : 'right');
			return true;
		case ' ':
			bench.say();
			return true;
		case 'Delete':
		case 'Backspace':
			bench.markers.remove(marker.letter);
			return true;
	}
	return false;
}
