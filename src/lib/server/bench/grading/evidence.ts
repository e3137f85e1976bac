import type { ResolvedSettings } from '$lib/schemas/settings';
import type { AttemptRecord, NumberAnswer, TakenReading } from '../exercise/attempt-record';
import type { DrawnExercise, NumberQuestion } from '../exercise/drawn-exercise';
import { quantityFrequencyHz } from '../exercise/quantity-frequency';
import { resolveSettings } from '../receiver/resolve-settings';
import { tableDb } from '../receiver/table-db';
import { displayedHz } from './displayed';
import { givenBy, isAbsoluteLevel } from './asked';
import { familyOf, type Family } from './family';
import type { SetUp } from './mistake';
import { noiseTakenOff } from './noise-in-reading';
import { ownError } from './own-error';

/** A reading with all that the grader asks of it. */
export interface Source extends TakenReading {
	family: Family;
	/** Which set-up of the log swept it, and how it stood. */
	entry: number;
	setUp: SetUp;
	/** Correction that was set, at the frequency read, dB. */
	appliedDb: number;
	/** What this receiver displays for each true hertz. */
	displayedPerHz: number;
	/** What it gives to the question, brought to the reference plane: lead and pad added, the correction already applied not counted twice. */
	planeValue: number;
	/** That with the noise taken off, where the question asks for it: what is right to report. NaN where nothing is left. */
	cleanValue: number;
}

export interface Evidence {
	drawn: DrawnExercise;
	question: NumberQuestion;
	answer: NumberAnswer | undefined;
	attached: Source | undefined;
	/** What the answer may rest on: the reading attached, else every reading taken. */
	pool: Source[];
	/** Every reading taken, attached or not. */
	taken: Source[];
	/** Every set-up that swept, newest first. */
	setUps: SetUp[];
}

/** What a correction adds back at a frequency, dB. */
export const correctionAt = (correctionDb: ResolvedSettings['correctionDb'], frequencyHz: number): number =>
	typeof correctionDb === 'number' ? correctionDb : tableDb(correctionDb, frequencyHz);

/** Whether the number a reading gives to a question is a level, which the lead shifts. */
function isLevelGiven({ reading }: TakenReading, { unit, part }: NumberQuestion): boolean {
	if (!unit.startsWith('dB')) return false;
	return isAbsoluteLevel(part === undefined ? reading.unit : unit);
}

function sourceOf(
	taken: TakenReading,
	drawn: DrawnExercise,
	question: NumberQuestion,
	record: AttemptRecord
): Source[] {
	const counted = taken.request.kind === 'count';
	const entry = record.log.findLastIndex(
		({ firstRow, sweeps }) => firstRow <= taken.rows.to && (sweeps > 0 || counted)
	);
	// Rows that no set-up swept are nobody's evidence.
	if (entry < 0) return [];
	const resolved = resolveSettings(record.log[entry].settings, drawn.profile);
	const trace = resolved.traces[taken.trace - 1] ?? resolved.traces[0];
	const readAtHz = quantityFrequencyHz(taken.request) || question.frequencyHz;
	const appliedDb = correctionAt(resolved.correctionDb, readAtHz);
	const shift = isLevelGiven(taken, question) ? question.leadDb + resolved.input.padDb - appliedDb : 0;
	const source = {
		...taken,
		family: familyOf(taken.request.kind),
		entry,
		setUp: { resolved, trace, sweeps: taken.rows.to - taken.rows.from + 1 },
		appliedDb,
		displayedPerHz: displayedHz({ drawn }, 1),
		planeValue: givenBy(taken.reading, question) + shift
	};
	const context = { drawn, question };
	const cleanValue = question.noiseTakenOff
		? noiseTakenOff(context, source, ownError(context))
		: source.planeValue;
	return [{ ...source, cleanValue }];
}

/** What there is to judge one question by, from what the log and the readings say. */
export function evidenceFor(drawn: DrawnExercise, question: NumberQuestion, record: AttemptRecord): Evidence {
	const answer = record.answers[question.id] as NumberAnswer | undefined;
	const sources = record.readings.flatMap((taken) => sourceOf(taken, drawn, question, record));
	const attached = sources.find((source) => source.id === answer?.readingId);
	const swept = record.log.filter((entry) => entry.sweeps > 0).reverse();
	return {
		drawn,
		question,
		answer,
		attached,
		pool: attached ? [attached] : sources,
		taken: sources,
		setUps: swept.map(({ settings, sweeps }) => {
			const resolved = resolveSettings(settings, drawn.profile);
			return { resolved, trace: resolved.traces[0], sweeps };
		})
	};
}
