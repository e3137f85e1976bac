/** The traces as a table for a spreadsheet, with everything that was set in the lines over it. */
import type { BenchSnapshot } from './bench-snapshot';
import { setUpLines } from './set-up-lines';

/**
 * One cell of text. A spreadsheet takes what begins with = + − @ or a control character for a formula, so such text gets an
 * apostrophe before it; commas, quotes and line ends are quoted.
 */
export function textCell(text: string): string {
	const safe = /^[=+\-@\t\r\n]/.test(text) ? `'${text}` : text;
	return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** A number as every spreadsheet reads it: a point, no grouping; blank where there is none. */
export const numberCell = (value: number | undefined, digits: number): string =>
	value === undefined || !Number.isFinite(value) ? '' : value.toFixed(digits);

/**
 * Header lines of two cells each, then one line a point: frequency in Hz (or time in s), and each trace in dBm.
 * @param who whose measurement it is; @param at when
 */
export function dataCsv(snapshot: BenchSnapshot, { who, at }: { who: string; at: Date }): string {
	const { axis, resolved, traces } = snapshot;
	const head: [string, string][] = [
		['Sweepwright', 'simulated signal, not an authorisation to work'],
		['Exercise', snapshot.title],
		['Order', snapshot.order],
		['For', snapshot.client],
		['By', who],
		['At', at.toISOString()],
		['Receiver', snapshot.receiver],
		['Sweep', snapshot.sweep],
		...setUpLines(resolved).map(({ label, text }): [string, string] => [label, plain(text)]),
		...(typeof resolved.correctionDb === 'number'
			? []
			: resolved.correctionDb.map(({ frequencyHz, db }): [string, string] => [
					'Correction',
					`${frequencyHz} Hz ${db} dB`
				]))
	];
	const points = Math.max(...traces.map(({ levelsDbm }) => levelsDbm.length), 0);
	const columns = [
		axis.kind === 'time' ? 'time_s' : 'frequency_Hz',
		...traces.map(({ words }) => textCell(`${words}, dBm`))
	];
	const step = points > 1 ? (axis.stop - axis.start) / (points - 1) : 0;
	const lines = Array.from({ length: points }, (_, i) =>
		[
			numberCell(axis.start + i * step, axis.kind === 'time' ? 9 : 3),
			...traces.map(({ levelsDbm }) => numberCell(levelsDbm[i], 3))
		].join(',')
	);
	return [...head.map((cells) => cells.map(textCell).join(',')), '', columns.join(','), ...lines, ''].join(
		'\r\n'
	);
}

/** Without the spaces and signs that only a page needs. */
const plain = (text: string): string => text.replaceAll(/[\u00a0\u202f]/g, ' ').replaceAll('−', '-');
