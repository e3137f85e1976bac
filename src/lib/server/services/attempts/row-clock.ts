/** When each row of one set-up begins on the bench clock: each where the one before it ended, retrace included. */
export class RowClock {
	readonly firstRow: number;
	readonly #durationS: (row: number) => number;
	/** Start of row firstRow + i, s. */
	readonly #startsS: number[];

	/**
	 * @param durationS bench time of a row with its retrace, s
	 * @param clockS bench clock when `firstRow` begins, s
	 */
	constructor(durationS: (row: number) => number, firstRow: number, clockS: number) {
		this.firstRow = firstRow;
		this.#durationS = durationS;
		this.#startsS = [clockS];
	}

	/** @param row `firstRow` or later */
	startS(row: number): number {
		const index = row - this.firstRow;
		if (!(index >= 0)) throw new RangeError(`row must be ${this.firstRow} or later, got ${row}`);
		const starts = this.#startsS;
		while (starts.length <= index) {
			const last = starts.length - 1;
			starts.push(starts[last] + this.#durationS(this.firstRow + last));
		}
		return starts[index];
	}

	endS(row: number): number {
		return this.startS(row + 1);
	}
}
