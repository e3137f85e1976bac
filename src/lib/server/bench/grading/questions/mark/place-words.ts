import type { MarkAnswer } from '$lib/server/bench/exercise/attempt-record';
import { quantityText } from '$lib/server/bench/exercise/quantity-text';

/** A place, or a band, in words, to a tenth of what the tolerance says matters. */
export function placeWords({ atHz, toHz }: MarkAnswer, toleranceHz: number): string {
	const digits = 0 - Math.floor(Math.log10(toleranceHz / 10) + 1e-9);
	const write = (hz: number) => quantityText(hz, 'Hz', digits);
	return toHz === undefined ? write(atHz) : `${write(atHz)} to ${write(toHz)}`;
}
