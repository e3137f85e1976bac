/** The new density of one zone of third-order products: two clusters less a third. */
import type { Line } from './emitter-kind';
import type { Cluster, CoreDensity } from './regrowth-clusters';
import { gridCluster, gridDensity, transformOf, type GriddedCluster } from './regrowth-grid';
import { waveformRegrowth } from './waveform-regrowth';

export interface Zone {
	/** Products at p + q − r. Equal clusters are the same object. */
	p: Cluster;
	q: Cluster;
	r: Cluster;
}

export interface ZoneTable {
	startHz: number;
	stepHz: number;
	/** Density for unit input powers and P_toi of one power unit, 1/Hz. */
	values: Float64Array;
}

/** Grid points: inside one cluster, twice that where it is many times as wide as its narrowest density, half across. */
const POINTS = 8192;
const MANY_TIMES = 20;
/** Values this far under the top are rounding. */
const ROUNDING = 1e-11;

const width = (cluster: Cluster): number => cluster.stopHz - cluster.startHz;

/**
 * Density of the products of a zone, by autocorrelations over lag (r: densities, l: lines, x = r + l):
 * 2|x|²x inside one cluster, 4x_p|x_q|², 2x_p²x_r*, 4x_p·x_q·x_r* across; less what is lines alone, less the parts that are
 * only gain (4ΣP_a²·r), less one of two where the same line counts twice (ΣP_a²·e^{2jω_aτ}·r*).
 * @returns null where nothing but lines take part
 */
export function zoneTable({ p, q, r }: Zone, lines: Line[], powerUnit: number): ZoneTable | null {
	const spanHz = width(p) + width(q) + width(r);
	if (!(spanHz > 0)) return null;
	const own = p === q && q === r;
	const points = !own ? POINTS / 2 : width(p) > MANY_TIMES * p.narrowestHz ? 2 * POINTS : POINTS;
	const grid = { points, stepHz: spanHz / (0.95 * points) };
	const gridded = new Map<Cluster, GriddedCluster>();
	for (const cluster of new Set([p, q, r]))
		gridded.set(cluster, gridCluster(cluster, lines, grid, powerUnit));
	const [gp, gq, gr] = [gridded.get(p)!, gridded.get(q)!, gridded.get(r)!];
	const product = new Float64Array(2 * points);
	const ways = p === q ? 2 : 4;
	addProduct(product, ways, withLines(gp), withLines(gq), withLines(gr));
	if (gp.line && gq.line && gr.line) addProduct(product, -ways, gp.line, gq.line, gr.line);
	// What only multiplies a density by a constant is gain: pairs of one line with itself.
	if (r === q) addScaled(product, -4 * gq.linePowerSquares, gp.density);
	if (p === q && gp.lineSquares) addConjugated(product, -1, gp.lineSquares, gr.density);
	const corrected = own ? p.densities.filter((core) => core.density.regrowth) : [];
	for (const core of corrected) {
		const single = gridDensity(core, gp.referenceBin, grid, powerUnit);
		addProduct(product, -2, single, single, single);
	}
	const spectrum = new Float64Array(2 * points);
	transformOf(points).transform(spectrum, product);
	const centreBin = gp.referenceBin + gq.referenceBin - gr.referenceBin;
	const values = new Float64Array(points);
	const scale = points ** 2 / grid.stepHz;
	for (let i = 0; i < points; i++) values[i] = scale * spectrum[2 * ((i + points / 2) % points)];
	const startHz = (centreBin - points / 2) * grid.stepHz;
	for (const core of corrected) addOwnRegrowth(values, core, startHz, grid.stepHz, powerUnit);
	return trim(values, startHz, grid.stepHz);
}

/** The real waveform's regrowth in place of the Gaussian one; constant-envelope signals have none. */
function addOwnRegrowth(
	values: Float64Array,
	{ density, startHz, stopHz }: CoreDensity,
	gridStartHz: number,
	stepHz: number,
	powerUnit: number
): void {
	const { regrowth } = density;
	if (!regrowth || regrowth === 'none') return;
	const shape = waveformRegrowth(regrowth.order, regrowth.rollOff);
	const height = (density.powerMw / powerUnit) ** 3 / regrowth.symbolRateHz;
	const centreHz = (startHz + stopHz) / 2;
	for (let i = 0; i < values.length; i++)
		values[i] += height * shape((gridStartHz + i * stepHz - centreHz) / regrowth.symbolRateHz);
}

function withLines(cluster: GriddedCluster): Float64Array {
	const { density, line } = cluster;
	return line ? density.map((value, i) => value + line[i]) : density;
}

/** out += gain·a·b·c*, all interleaved complex. */
function addProduct(
	out: Float64Array,
	gain: number,
	a: Float64Array,
	b: Float64Array,
	c: Float64Array
): void {
	for (let i = 0; i < out.length; i += 2) {
		const re = a[i] * b[i] - a[i + 1] * b[i + 1];
		const im = a[i] * b[i + 1] + a[i + 1] * b[i];
		out[i] += gain * (re * c[i] + im * c[i + 1]);
		out[i + 1] += gain * (im * c[i] - re * c[i + 1]);
	}
}

/** out += gain·a·c*. */
function addConjugated(out: Float64Array, gain: number, a: Float64Array, c: Float64Array): void {
	for (let i = 0; i < out.length; i += 2) {
		out[i] += gain * (a[i] * c[i] + a[i + 1] * c[i + 1]);
		out[i + 1] += gain * (a[i + 1] * c[i] - a[i] * c[i + 1]);
	}
}

function addScaled(out: Float64Array, gain: number, a: Float64Array): void {
	if (gain !== 0) for (let i = 0; i < out.length; i++) out[i] += gain * a[i];
}

/** Leaves out the ends where there is nothing but rounding, and clears it in between. */
function trim(values: Float64Array, startHz: number, stepHz: number): ZoneTable | null {
	let top = 0;
	for (const value of values) top = Math.max(top, value);
	if (top === 0) return null;
	const kept = values.map((value) => (value > ROUNDING * top ? value : 0));
	const first = kept.findIndex((value) => value > 0);
	let last = kept.length - 1;
	while (kept[last] === 0) last--;
	return { startHz: startHz + first * stepHz, stepHz, values: kept.slice(first, last + 1) };
}
