/** What fits on the one page of a report: readings that answers rest on first, then as many others as there is room for. */
import type { ReportView } from '$lib/schemas/report';
import { readingWords } from '../bench/readings/reading-words';

type Reading = ReportView['readings'][number];

/** Lines that the page has for set-up or connection, readings and answers together: 1047 px of A4 less what always stands there, measured, at 17 px each. */
const pageLines = 22.5;
/** Characters on one line of each column: somewhat fewer than it takes, so that the page never runs over. */
const columns = { setUp: 54, connected: 36, reading: 36, remark: 40, question: 56 };
/** A row of a table is taller than a line by its padding and rule. */
const rowLines = 0.45;

const linesOf = (text: string, characters: number): number => Math.ceil(text.length / characters);
const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

export const remarkText = (reading: Pick<Reading, 'remarks'>): string =>
	reading.remarks.map(({ text }) => text).join(' ');

const bareLines = ({ request }: Reading): number =>
	rowLines + linesOf(readingWords(request), columns.reading);
const remarkLines = (reading: Reading): number => linesOf(remarkText(reading), columns.remark);

export interface PageReading {
	reading: Reading;
	/** Its remarks stand under it. */
	remarked: boolean;
}
export interface PageRoom {
	/** In the order taken. */
	readings: PageReading[];
	/** How many are not on the page. */
	left: number;
	/** How many of those on the page stand there without their remarks. */
	unremarked: number;
}

/**
 * Chooses the readings of a report. Those that answers rest on are always there; their remarks too, as far as there is room.
 * @param setUp what stands under "Set-up", a string for each entry
 * @param connected what stands under "Connected"
 */
export function pageRoom(
	{ readings, answers }: Pick<ReportView, 'readings' | 'answers'>,
	setUp: readonly string[],
	connected: readonly string[]
): PageRoom {
	const above = Math.max(
		sum(setUp.map((text) => linesOf(text, columns.setUp))),
		sum(connected.map((text) => linesOf(text, columns.connected)))
	);
	const below = sum(answers.map(({ text }) => rowLines + linesOf(text, columns.question)));
	const isAttached = ({ id }: Reading) => answers.some(({ readingId }) => readingId === id);
	const attached = readings.filter(isAttached);
	let room = pageLines - above - below - sum(attached.map(bareLines));
	const take = (lines: number): boolean => {
		if (lines > room) return false;
		room -= lines;
		return true;
	};
	const chosen = attached.map((reading) => ({ reading, remarked: take(remarkLines(reading)) }));
	for (const reading of readings.filter((one) => !isAttached(one)))
		if (take(bareLines(reading) + remarkLines(reading))) chosen.push({ reading, remarked: true });
	return {
		readings: chosen.sort((a, b) => a.reading.id - b.reading.id),
		left: readings.length - chosen.length,
		unremarked: chosen.filter(({ remarked }) => !remarked).length
	};
}
