/** The densities that third-order products of densities, and of lines with densities, add. */
import type { Density, Line } from './emitter-kind';
import { clustersOf, coreOf, type Cluster } from './regrowth-clusters';
import { zoneTable, type Zone, type ZoneTable } from './regrowth-zone';
import { scaleDensity } from './scale-density';
import { tabulatedDensity } from './tabulated-density';

export interface ProductDensity extends Density {
	/** Indices of the input densities and lines it is made of; absent on an input density. */
	parents?: { densities: number[]; lines: number[] };
}

/** Densities that enter, strongest first. */
const MOST_DENSITIES = 16;
/** Zones that are worked out, strongest first. */
const MOST_ZONES = 40;
/** 20 dB under kT₀: a weaker product is out of sight of every receiver, mW/Hz. */
const FAINT_MW_PER_HZ = 10 ** ((-173.975 - 20) / 10);

const prepared = new Map<string, ZoneTable | null>();
const MOST_PREPARED = 128;

/**
 * New densities of y = x − x|x|²/P_toi for Gaussian densities S and lines: 2(S∗S∗S̃)/P_toi², and with lines as bench.md §4
 * has it; a linearly modulated density shows its own waveform's regrowth, a constant envelope none.
 * Zones that would fall below 0 Hz are left out.
 */
export function densityProducts(
	densities: Density[],
	lines: Line[],
	entering: number[],
	toiMw: number
): ProductDensity[] {
	const cores = densities
		.map((density, index) => ({ density, index }))
		.filter(({ density }) => density.powerMw > 0)
		.sort((a, b) => b.density.powerMw - a.density.powerMw)
		.slice(0, MOST_DENSITIES)
		.map(({ density, index }) => coreOf(density, index));
	if (cores.length === 0) return [];
	const clusters = clustersOf(
		cores,
		entering.map((index) => ({ index, line: lines[index] }))
	);
	const unit = clusters.reduce((sum, cluster) => sum + cluster.powerMw, 0);
	const describe = clusterDescriber(lines, unit);
	return zonesOf(clusters, toiMw).flatMap((zone) => {
		const key = [zone.p, zone.q, zone.r].map(describe).join(' | ');
		let table = prepared.get(key);
		if (table === undefined) {
			if (prepared.size >= MOST_PREPARED) prepared.clear();
			table = zoneTable(zone, lines, unit);
			prepared.set(key, table);
		}
		if (!table) return [];
		const density = scaleDensity(tabulatedDensity(table, key), unit ** 3 / toiMw ** 2);
		return [{ ...density, parents: parentsOf(zone) }];
	});
}

/** All p + q − r with a density in it whose top may be seen, strongest first. */
function zonesOf(clusters: Cluster[], toiMw: number): Zone[] {
	const zones: { zone: Zone; top: number }[] = [];
	clusters.forEach((p, i) => {
		for (const q of clusters.slice(i)) {
			for (const r of clusters) {
				// p + q − p is what q + p − p already is, once.
				if (r === p && q !== p) {
					add({ p: q, q: p, r: p });
				} else add({ p, q, r });
			}
		}
	});
	function add(zone: Zone): void {
		const { p, q, r } = zone;
		const widest = Math.max(...[p, q, r].map((c) => (c.densities.length ? c.narrowestHz : 0)));
		if (widest === 0 || p.stopHz + q.stopHz - r.startHz <= 0) return;
		const ways = p === q ? 2 : 4;
		const top = (ways * p.powerMw * q.powerMw * r.powerMw) / toiMw ** 2 / widest;
		if (top > FAINT_MW_PER_HZ) zones.push({ zone, top });
	}
	return zones
		.sort((a, b) => b.top - a.top)
		.slice(0, MOST_ZONES)
		.map(({ zone }) => zone);
}

/** Names a cluster by what it holds, powers as shares of the whole, so that an attenuator changes nothing. */
function clusterDescriber(lines: Line[], unit: number): (cluster: Cluster) => string {
	const known = new Map<Cluster, string>();
	const share = (powerMw: number) => (powerMw / unit).toPrecision(10);
	return (cluster) => {
		let text = known.get(cluster);
		if (text === undefined) {
			text = [
				...cluster.densities.map(({ density }) => `${density.shapeKey}*${share(density.powerMw)}`),
				...cluster.lines.map((i) => `${lines[i].frequencyHz}*${share(lines[i].re ** 2 + lines[i].im ** 2)}`)
			].join(', ');
			known.set(cluster, text);
		}
		return text;
	};
}

function parentsOf({ p, q, r }: Zone): { densities: number[]; lines: number[] } {
	const clusters = [...new Set([p, q, r])];
	return {
		densities: clusters.flatMap((cluster) => cluster.densities.map((core) => core.index)),
		lines: clusters.flatMap((cluster) => cluster.lines)
	};
}
