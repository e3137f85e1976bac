import type { EntryContent, EntryLine } from '$lib/schemas/logbook';
import { describeReading } from '$lib/server/bench/grading/describe-reading';
import { formatFrequency } from '$lib/units/format-quantity';

/** What an entry is: "channel power, 25 kHz", "picture, sweep 14", "set-up at 450 MHz". */
export function entryWords(kind: EntryLine['kind'], { reading, picture, resolved }: EntryContent): string {
	if (kind === 'reading' && reading) return describeReading(reading.request);
	if (kind === 'picture' && picture) return `picture, sweep ${picture.row + 1}`;
	const { centreHz, spanHz } = resolved;
	return `set-up at ${formatFrequency(centreHz)}${spanHz > 0 ? `, span ${formatFrequency(spanHz)}` : ''}`;
}
