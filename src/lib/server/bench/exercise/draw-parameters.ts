import type { Exercise, ParameterDraw } from '$lib/schemas/exercise';
import { Random, type Seed } from '../receiver/random';
import type { Scope } from './expression';
import { fillTemplate } from './fill-template';

/** Twelve digits hide the binary remainder of a decimal step: 3 + 3 × 0.1 is 3.3. */
const tidy = (value: number): number => Number(value.toPrecision(12));

function drawOne(draw: ParameterDraw, share: number): number | string {
	switch (draw.draw) {
		case 'uniform':
			return draw.from + share * (draw.to - draw.from);
		case 'integer':
			return draw.from + Math.floor(share * (draw.to - draw.from + 1));
		case 'step': {
			const steps = Math.floor((draw.to - draw.from) / draw.step + 1e-9);
			return tidy(draw.from + draw.step * Math.floor(share * (steps + 1)));
		}
		case 'choice':
			return draw.of[Math.floor(share * draw.of.length)];
	}
}

/**
 * Every parameter of an exercise, drawn from the attempt's seed, and the values derived from them in their order.
 * Each parameter has a stream of its own, so adding one never moves another.
 * @param redraw 0 for the first draw; the number of the draw after ones that were turned down
 */
export function drawParameters(exercise: Exercise, seed: Seed, redraw: number): Scope {
	const scope: Record<string, number | string> = {};
	for (const [name, draw] of Object.entries(exercise.parameters)) {
		scope[name] = drawOne(draw, new Random(seed, -1, `parameter/${redraw}/${name}`).uniform());
	}
	for (const [name, value] of Object.entries(exercise.derived)) {
		scope[name] = fillTemplate(value, scope, `derived.${name}`) as number;
	}
	return scope;
}
