import type { RowClock } from './row-clock';

/** How far an attempt has been swept. */
export interface BenchPosition {
	/** The first row that nobody has begun. */
	nextRow: number;
	/** Bench clock, s. */
	clockS: number;
	/** When row nextRow − 1 ends, s: beyond `clockS` while it is being swept. */
	rowEndS: number;
}

/**
 * The position one slice of bench time later. Rows shorter than the slice are begun only to be finished;
 * a longer one advances slice by slice, so that whoever interrupts it pays for the time that passed and no more.
 * @param sliceS bench time to pass at least, s (less when `untilRow` ends first)
 * @param untilRow no row from here on is begun
 */
export function advanceBench(
	position: BenchPosition,
	rows: RowClock,
	sliceS: number,
	untilRow = Infinity
): BenchPosition {
	const targetS = position.clockS + sliceS;
	let { nextRow, rowEndS } = position;
	let clockS = Math.max(position.clockS, Math.min(targetS, rowEndS));
	while (clockS < targetS && nextRow < untilRow) {
		rowEndS = rows.endS(nextRow);
		const short = rowEndS - clockS <= sliceS;
		clockS = short ? rowEndS : targetS;
		nextRow += 1;
	}
	return { nextRow, clockS, rowEndS };
}

/** The first row that isn't finished: one more than the last that could have been drawn whole. */
export const firstUnfinishedRow = ({ nextRow, clockS, rowEndS }: BenchPosition): number =>
	clockS < rowEndS ? nextRow - 1 : nextRow;
