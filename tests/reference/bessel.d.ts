/** The check library of `signal-modulation.test.ts`, which ships no types. */
declare module 'bessel' {
	export function besselj(x: number, n: number): number;
}
