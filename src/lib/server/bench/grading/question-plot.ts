import type { FindingPlot } from '$lib/schemas/questions/finding';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { formatFrequency } from '$lib/units/format-quantity';
import type { SettingsLogEntry } from '../exercise/attempt-record';
import type { NumberQuestion } from '../exercise/drawn-exercise';
import { resolveSettings } from '../receiver/resolve-settings';
import { askedName } from './describe-reading';
import type { Judgement } from './judge-question';
import { placeHz } from './place';
import { widthHzOf } from './read-width';
import { signalLevels } from './signal-levels';

/** What the plot beside a finding draws: the sweep read, the signal itself, the band asked for, the point read. */
export function questionPlot({ evidence, source }: Judgement, log: readonly SettingsLogEntry[]): FindingPlot {
	const { drawn, question } = evidence;
	const last = log.findLast((entry) => entry.sweeps > 0);
	const resolved = source?.setUp.resolved ?? (last && resolveSettings(last.settings, drawn.profile));
	const rows = source?.rows ?? (last && { from: last.firstRow, to: last.firstRow + last.sweeps - 1 });
	const pointHz = source?.family === 'point' ? placeHz(source.reading) : undefined;
	return {
		band: bandOf(question),
		at: atOf(question),
		point: pointHz === undefined || !source ? null : { frequencyHz: pointHz, levelDbm: source.reading.value },
		trace: rows && resolved ? drawnTrace(rows, resolved, source?.trace ?? 1) : null,
		signal: resolved ? signalLevels(drawn.scene, resolved) : null
	};
}

/** The band asked for, at its true level; a bandwidth that is asked for is a band itself. */
function bandOf(question: NumberQuestion): FindingPlot['band'] {
	const { quantity, frequencyHz, truth: value, unit } = question;
	const isWidth = quantity.kind === 'occupied-bandwidth' || quantity.kind === 'x-db-bandwidth';
	const width = isWidth && question.part === undefined ? value : widthHzOf(quantity);
	if (width === undefined || frequencyHz === 0) return null;
	return {
		startHz: frequencyHz - width / 2,
		stopHz: frequencyHz + width / 2,
		value,
		unit,
		text: isWidth ? `true ${askedName(question)}` : `true ${askedName(question)}, ${formatFrequency(width)}`
	};
}

/** The frequency asked for, where it is one on the axis: not a width, a deviation or a modulating frequency. */
function atOf(question: NumberQuestion): FindingPlot['at'] {
	const { quantity, part, truth: frequencyHz, unit } = question;
	const onAxis =
		['count', 'peak', 'next-peak', 'marker'].includes(quantity.kind) ||
		(typeof part === 'string' && ['lowerHz', 'upperHz', 'frequencyHz'].includes(part));
	return unit === 'Hz' && onAxis ? { frequencyHz, text: `true ${askedName(question)}` } : null;
}

/** Which rows make a trace of a set-up. */
export function drawnTrace(rows: { from: number; to: number }, resolved: ResolvedSettings, trace: number) {
	const { mode, count } = resolved.traces[trace - 1];
	return { fromRow: rows.from, toRow: rows.to, trace, mode, count, scale: resolved.scale };
}
