import type { LossTable } from '$lib/schemas/scene';
import { tableDb } from '../receiver/table-db';

/** Loss of a lead at `frequencyHz`, dB: straight between the points of its table, flat outside. */
export const lossDbAt = (table: LossTable, frequencyHz: number): number =>
	tableDb(
		table.map((point) => ({ frequencyHz: point.frequencyHz, db: point.lossDb })),
		frequencyHz
	);
