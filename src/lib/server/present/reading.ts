import type { ReadingView } from '$lib/schemas/attempt';
import type { BenchRequest } from '$lib/schemas/reading';

export interface ReadingRecord {
	id: number;
	fromRow: number;
	toRow: number;
	trace: number | null;
	mode: string | null;
	rowCount: number;
	request: BenchRequest;
	kind: string;
	value: number;
	unit: string;
	spread: number;
	remarks: { code: string; text: string }[];
	parts: unknown;
	takenAt: Date;
}

/** @param setUpNumber of the set-up that swept its last row */
export const presentReading = (reading: ReadingRecord, setUpNumber: number): ReadingView => ({
	id: reading.id,
	rows: { from: reading.fromRow, to: reading.toRow },
	trace: reading.trace,
	mode: reading.mode,
	count: reading.rowCount,
	request: reading.request,
	kind: reading.kind,
	value: reading.value,
	unit: reading.unit,
	spread: reading.spread,
	remarks: reading.remarks.map(({ code, text }) => ({ code, text })),
	...((reading.parts ?? null) === null ? {} : { parts: reading.parts }),
	setUp: setUpNumber,
	takenAt: reading.takenAt.toISOString()
});
