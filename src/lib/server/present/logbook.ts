import type { EntryContent, EntryLine, EntryView } from '$lib/schemas/logbook';
import { formatFigure, showFrequency, showTime, type Shown } from '$lib/units/format-quantity';
import { presentSetUp } from './set-up-lines';

interface EntryRecord {
	id: number;
	kind: EntryLine['kind'];
	attemptId: number;
	exercise: string;
	content: EntryContent;
	note: string;
	keptAt: Date;
}

/** @param what the entry is, in words */
export const presentEntryLine = (entry: EntryRecord, what: string): EntryLine => ({
	id: entry.id,
	kind: entry.kind,
	keptAt: entry.keptAt.toISOString(),
	exercise: { slug: entry.exercise, title: entry.content.title, place: entry.content.place },
	attempt: { id: entry.attemptId, number: entry.content.attempt },
	what,
	value: entry.content.reading && presentValue(entry.content.reading.value, entry.content.reading.unit),
	note: entry.note
});

export function presentEntry(entry: EntryRecord, what: string): EntryView {
	const { reading, picture, resolved } = entry.content;
	return {
		...presentEntryLine(entry, what),
		setUp: presentSetUp(resolved),
		resolved,
		picture,
		remarks: reading?.remarks.map(({ text }) => text) ?? [],
		spread: reading && reading.spread > 0 ? presentSpread(reading.spread, reading.unit) : null
	};
}

/** A reading's value as the bench shows it. */
function presentValue(value: number, unit: string): Shown {
	if (unit === 'Hz') return showFrequency(value, value < 1000 ? 1 : 3);
	if (unit === 's') return showTime(value, 3);
	if (unit === '1') return { figure: formatFigure(value, 2), unit: '' };
	return { figure: formatFigure(value, 1), unit };
}

/** One standard deviation, to two figures. */
function presentSpread(spread: number, unit: string): string {
	const rounded = Number(spread.toPrecision(2));
	const { figure, unit: shown } =
		unit === 'Hz'
			? showFrequency(rounded, rounded < 1 ? 3 : undefined)
			: unit === 's'
				? showTime(rounded)
				: { figure: String(rounded), unit: unit === '1' ? '' : unit.startsWith('dB') ? 'dB' : unit };
	return `±${figure}${shown && `\u00a0${shown}`}`;
}
