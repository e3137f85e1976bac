/** Nodes on [0, 1] and weights of the 15-point Kronrod rule, and of the 7-point Gauss rule inside it (QUADPACK). */
const NODES = [
	0.9914553711208126, 0.9491079123427585, 0.8648644233597691, 0.7415311855993945, 0.5860872354676911,
	0.4058451513773972, 0.2077849550078985, 0
];
const KRONROD = [
	0.0229353220105292, 0.0630920926299786, 0.1047900103222502, 0.1406532597159259, 0.1690047266392679,
	0.1903505780647854, 0.2044329400752989, 0.2094821410847278
];
const GAUSS = [0, 0.1294849661688697, 0, 0.2797053914892767, 0, 0.3818300505051189, 0, 0.4179591836734694];

const RELATIVE = 1e-8;
const DEEPEST = 24;

/**
 * ∫f from `start` to `stop` by adaptive Gauss-Kronrod quadrature, to about 1e-8 of the whole.
 * @param breaks where f may bend or jump: no rule is laid across one
 */
export function integrate(f: (x: number) => number, start: number, stop: number, breaks: number[]): number {
	const inside = breaks.filter((x) => x > start && x < stop).sort((a, b) => a - b);
	const knots = [start, ...inside, stop];
	const pieces = knots.slice(1).map((to, i) => ({ from: knots[i], to, rule: rule(f, knots[i], to) }));
	const scale = pieces.reduce((sum, piece) => sum + Math.abs(piece.rule.value), 0);
	return pieces.reduce((sum, { from, to, rule }) => sum + refine(f, from, to, rule, scale * RELATIVE, 0), 0);
}

interface Estimate {
	value: number;
	error: number;
}

function rule(f: (x: number) => number, from: number, to: number): Estimate {
	const middle = (from + to) / 2;
	const half = (to - from) / 2;
	let kronrod = 0;
	let gauss = 0;
	NODES.forEach((node, i) => {
		const sum = node === 0 ? f(middle) : f(middle - half * node) + f(middle + half * node);
		kronrod += KRONROD[i] * sum;
		gauss += GAUSS[i] * sum;
	});
	return { value: half * kronrod, error: Math.abs(half * (kronrod - gauss)) };
}

function refine(
	f: (x: number) => number,
	from: number,
	to: number,
	whole: Estimate,
	tolerance: number,
	depth: number
): number {
	if (whole.error <= tolerance || depth === DEEPEST) return whole.value;
	const middle = (from + to) / 2;
	const halves: [number, number][] = [
		[from, middle],
		[middle, to]
	];
	return halves.reduce((sum, [a, b]) => sum + refine(f, a, b, rule(f, a, b), tolerance / 2, depth + 1), 0);
}
