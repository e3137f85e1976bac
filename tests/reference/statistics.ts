/** Statistics that the check vectors expect of a sweep's rows. Their definitions stand beside each. */
export interface Expectation {
	stat: string;
	fromHz?: number;
	toHz?: number;
	noiseBandwidthHz?: number;
	value: number;
	tolerance: number;
	from: string;
}

export interface SweptRows {
	startHz: number;
	stopHz: number;
	points: number;
	levelsDbm: ArrayLike<number>[];
}

const mean = (values: number[]): number => values.reduce((a, b) => a + b, 0) / values.length;
const mw = (levelDbm: number): number => 10 ** (levelDbm / 10);

export function statistic(result: SweptRows, expected: Expectation): number {
	const { startHz, stopHz, points } = result;
	const step = (stopHz - startHz) / (points - 1);
	const from = expected.fromHz ?? -Infinity;
	const to = expected.toHz ?? Infinity;
	const picked: number[] = [];
	for (let i = 0; i < points; i++) {
		const f = startHz + i * step;
		if (f >= from - step * 1e-6 && f <= to + step * 1e-6) picked.push(i);
	}
	const rows = result.levelsDbm.map((row) => picked.map((i) => row[i]));
	const all = rows.flat();
	switch (expected.stat) {
		case 'mean-power':
			return 10 * Math.log10(mean(all.map(mw)));
		case 'mean-level':
			return mean(all);
		case 'std-level': {
			const m = mean(all);
			return Math.sqrt(mean(all.map((l) => (l - m) ** 2)));
		}
		case 'lag1': {
			const powers = rows.map((row) => row.map(mw));
			const m = mean(powers.flat());
			let product = 0;
			let count = 0;
			for (const row of powers)
				for (let i = 1; i < row.length; i++, count++) product += (row[i] - m) * (row[i - 1] - m);
			return product / count / mean(powers.flat().map((p) => (p - m) ** 2));
		}
		case 'max-level':
			return mean(rows.map((row) => Math.max(...row)));
		case 'min-level':
			return mean(rows.map((row) => Math.min(...row)));
		case 'width-3db':
			return mean(
				rows.map((row) => {
					const limit = Math.max(...row) - 3.0103;
					const first = row.findIndex((l) => l >= limit);
					const last = row.length - 1 - [...row].reverse().findIndex((l) => l >= limit);
					return (last - first) * step;
				})
			);
		case 'total-power':
			return (
				10 *
				Math.log10(
					mean(rows.map((row) => row.reduce((sum, l) => sum + mw(l), 0) * step)) / expected.noiseBandwidthHz!
				)
			);
		default:
			throw new Error(`unknown statistic ${expected.stat}`);
	}
}
