/** Dots of a strip plot: each at its error, stacked from the middle where they would cover each other. */
export interface Dot {
	x: number;
	y: number;
	/** Of the seed, from 0. */
	index: number;
}

export interface Scale {
	/** Errors at the strip's ends. */
	from: number;
	to: number;
}

/** From all errors and the tolerance, with some air: symmetric where errors fall on both sides. */
export function scaleOf(rows: readonly (readonly (number | null)[])[], tolerance: number): Scale {
	const errors = rows.flat().filter((error) => error !== null);
	const from = Math.min(-1.5 * tolerance, ...errors);
	const to = Math.max(1.5 * tolerance, ...errors);
	const air = 0.03 * (to - from);
	return { from: from - air, to: to + air };
}

/** @param size of the strip and of a dot's cell, px */
export function dotsOf(
	errors: readonly (number | null)[],
	{ from, to }: Scale,
	size: { widthPx: number; heightPx: number; cellPx: number }
): Dot[] {
	const { widthPx, heightPx, cellPx } = size;
	const most = Math.max(1, Math.floor(heightPx / cellPx));
	const columns = new Map<number, number>();
	return errors.flatMap((error, index) => {
		if (error === null) return [];
		const column = Math.round((((error - from) / (to - from)) * widthPx) / cellPx);
		const nth = columns.get(column) ?? 0;
		columns.set(column, nth + 1);
		// 0, 1, −1, 2, −2 …; where a column is full, dots lie on each other.
		const step = Math.min(nth, most - 1);
		const offset = step % 2 === 1 ? (step + 1) / 2 : -step / 2;
		return [{ x: column * cellPx, y: heightPx / 2 + offset * cellPx, index }];
	});
}

/** Seeds worth looking at, counted from the first: where the taught method is furthest off, or a mistake comes nearest. */
export function worstSeeds(
	{ errors, mistake }: { errors: readonly (number | null)[]; mistake: string | null },
	fromSeed: number,
	most = 3
): number[] {
	const size = (error: number | null) =>
		error === null ? (mistake === null ? Infinity : -1) : Math.abs(error);
	return errors
		.map((error, i) => ({ seed: fromSeed + i, size: size(error) }))
		.filter((one) => one.size >= 0)
		.sort((a, b) => (mistake === null ? b.size - a.size : a.size - b.size))
		.slice(0, most)
		.map(({ seed }) => seed);
}
