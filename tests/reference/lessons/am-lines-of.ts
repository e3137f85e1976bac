import { truth } from '$lib/server/bench/truth/truth';

/** Levels of lower sideband, carrier and upper sideband of a carrier modulated by 1 kHz to `depth`, dBm. */
export function amLinesOf(depth: number): [number, number, number] {
	const scene = {
		emitters: [{ kind: 'am' as const, frequencyHz: 1.296e6, levelDbm: -12, modulatingHz: 1000, depth }]
	};
	const at = (atHz: number) => truth(scene, { kind: 'marker', atHz }).value;
	return [at(1.295e6), at(1.296e6), at(1.297e6)];
}
