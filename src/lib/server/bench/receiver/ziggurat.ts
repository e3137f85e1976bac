/**
 * Tables of the 128-layer ziggurat for the normal law (Marsaglia & Tsang 2000), made from their two constants:
 * where the tail starts and the common area of the layers.
 */
export const TAIL_START = 3.442619855899;
const LAYER_AREA = 9.91256303526217e-3;
const SCALE = 2147483648;

/** Largest |32-bit value| that lies inside the layer for certain. */
export const layerBounds = new Float64Array(128);
/** Scale from a 32-bit value to x in each layer, and the density at each layer's outer edge. */
export const layerEdges = { width: new Float64Array(128), density: new Float64Array(128) };

const density = (x: number): number => Math.exp(-0.5 * x * x);

let edge = TAIL_START;
let previous = edge;
const baseWidth = LAYER_AREA / density(edge);
layerBounds[0] = Math.floor((edge / baseWidth) * SCALE);
layerBounds[1] = 0;
layerEdges.width[0] = baseWidth / SCALE;
layerEdges.width[127] = edge / SCALE;
layerEdges.density[0] = 1;
layerEdges.density[127] = density(edge);
for (let i = 126; i >= 1; i--) {
	edge = Math.sqrt(-2 * Math.log(LAYER_AREA / edge + density(edge)));
	layerBounds[i + 1] = Math.floor((edge / previous) * SCALE);
	previous = edge;
	layerEdges.density[i] = density(edge);
	layerEdges.width[i] = edge / SCALE;
}
