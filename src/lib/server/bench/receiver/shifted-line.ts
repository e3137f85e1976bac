import type { PassingLine } from './line-response';

/** The same passage seen from a later start. */
export function shifted(line: PassingLine, byS: number): PassingLine {
	const rate = line.passingHzPerS;
	const psi = 2 * Math.PI * ((line.offsetHz * byS) % 1) - Math.PI * rate * byS * byS;
	const cos = Math.cos(psi);
	const sin = Math.sin(psi);
	return {
		re: line.re * cos - line.im * sin,
		im: line.re * sin + line.im * cos,
		offsetHz: line.offsetHz - rate * byS,
		passingHzPerS: rate
	};
}
