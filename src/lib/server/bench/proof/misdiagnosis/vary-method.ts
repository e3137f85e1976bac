/** The same thing done by different people: other spans, filters, points, sweeps, a marker not quite in the middle. */
import type { BenchRequest } from '$lib/schemas/reading';
import type { Settings } from '$lib/schemas/settings';
import type { DrawnExercise, NumberQuestion, FilledStep } from '$lib/server/bench/exercise/drawn-exercise';
import { sameWidth, widthHzOf } from '$lib/server/bench/grading/read-width';
import { isAbsoluteLevel } from '$lib/server/bench/grading/asked';
import { correctsOnBench, withSettings, withSum } from '$lib/server/bench/grading/spoil';
import type { Random } from '$lib/server/bench/receiver/random';
import { coarsestStepHz } from './coarsest-step';
import { extentOf, type Extent } from './extent';

const between = (random: Random, from: number, to: number): number => from + (to - from) * random.uniform();
const chance = (random: Random, share: number): boolean => random.uniform() < share;

/** The lead added back by hand, by some of those who are taught to type it as a correction. */
export function byHandOrBench(drawn: DrawnExercise, question: NumberQuestion, random: Random): FilledStep[] {
	const { method } = drawn;
	const typed = method.flatMap((step) =>
		step.do === 'set' && step.settings.correctionDb !== undefined ? [step.settings.correctionDb] : []
	);
	const plain = typed.length === 1 && typeof typed[0] === 'number' && isAbsoluteLevel(question.unit);
	if (!plain || !correctsOnBench(method) || !chance(random, 0.3)) return method;
	return withSum(
		withSettings(method, { correctionDb: 0 }),
		question.id,
		(value) => value + (typed[0] as number)
	);
}

/**
 * A method as one person would do it. What differs from the taught method, the mistake, is left as it is.
 * @param sound only what a careful person would choose: no wider filter, no fewer sweeps
 */
export function varyMethod(
	steps: readonly FilledStep[],
	drawn: DrawnExercise,
	question: NumberQuestion,
	random: Random,
	sound: boolean
): FilledStep[] {
	const extent = extentOf(steps);
	const sweepsBy = between(random, sound ? 1 : 0.6, 1.8);
	const view = {
		spanBy: between(random, 0.8, extent.whole ? 1.1 : 1.6),
		moveBy: between(random, -0.03, 0.03),
		filterBy: chance(random, 0.25) ? -1 : !sound && chance(random, 0.15) ? 1 : 0,
		points: [501, 1001, 1501, 2001][Math.floor(4 * random.uniform())]
	};
	const coarsest = (rbwHz: number) => coarsestStepHz(rbwHz, { steps, question, sound });
	const lookedFirst = chance(random, 0.4);
	const taught = new Set(drawn.method.flatMap((step) => (step.do === 'set' ? [step.settings.rbwHz] : [])));
	const varied = steps.map((step): FilledStep => {
		if (step.do === 'set') {
			const isTaught = taught.has(step.settings.rbwHz);
			return {
				...step,
				settings: varySettings(step.settings, drawn, { ...view, extent, sweepsBy, isTaught, coarsest })
			};
		}
		if (step.do === 'sweep') return { ...step, sweeps: Math.max(1, Math.round(step.sweeps * sweepsBy)) };
		if (step.do === 'read') return { ...step, reading: varyReading(step.reading, question, random) };
		return step;
	});
	return lookedFirst ? [{ do: 'sweep', sweeps: 1 }, ...varied] : varied;
}

interface View {
	spanBy: number;
	moveBy: number;
	/** Steps of the receiver's list. */
	filterBy: number;
	points: number;
	extent: Extent;
	sweepsBy: number;
	isTaught: boolean;
	/** How far apart points of one's own choosing may lie with a filter of so many hertz. */
	coarsest: (rbwHz: number) => number;
}

function varySettings(settings: Settings, drawn: DrawnExercise, view: View): Settings {
	const next: Settings = { ...settings };
	if (settings.centreHz !== undefined && settings.spanHz) {
		const spanHz = settings.spanHz * view.spanBy;
		const centreHz = settings.centreHz + view.moveBy * settings.spanHz;
		if (holds(centreHz, spanHz, view.extent)) Object.assign(next, { centreHz, spanHz });
	}
	const { rbwHz } = settings;
	if (typeof rbwHz === 'number' && view.isTaught && settings.sweepTimeS === undefined) {
		const list = drawn.profile.rbwHz;
		next.rbwHz = list[list.indexOf(rbwHz) + view.filterBy] ?? rbwHz;
	}
	const spanHz = next.spanHz ?? 0;
	const finest = typeof next.rbwHz === 'number' ? next.rbwHz : spanHz / 100;
	const asked = settings.points ?? 1001;
	if (spanHz > 0 && spanHz / (view.points - 1) <= Math.max(view.coarsest(finest), spanHz / (asked - 1))) {
		next.points = view.points;
	}
	if (settings.traces) {
		next.traces = settings.traces.map(({ count, ...trace }) =>
			count === undefined ? trace : { ...trace, count: Math.max(1, Math.round(count * view.sweepsBy)) }
		);
	}
	return next;
}

/** Everything read is in view, with a little room beside it. */
const holds = (centreHz: number, spanHz: number, { lowHz, highHz }: Extent): boolean =>
	!(lowHz < centreHz - 0.48 * spanHz) && !(highHz > centreHz + 0.48 * spanHz);

/**
 * A bracket typed or dragged is right to a hundredth of its width, a wrong one is of any such width; a marker stands
 * somewhere about the middle of a hump; a gate is whatever people choose.
 */
function varyReading(request: BenchRequest, question: NumberQuestion, random: Random): BenchRequest {
	const asked = widthHzOf(question.quantity);
	if (request.kind === 'count') return { ...request, gateS: request.gateS * between(random, 0.7, 2) };
	if (request.kind === 'marker' && request.atHz !== undefined && asked !== undefined) {
		return { ...request, atHz: request.atHz + between(random, -0.08, 0.08) * asked };
	}
	const { centreHz, widthHz } = request as { centreHz?: number; widthHz?: number };
	if (widthHz === undefined || centreHz === undefined) return request;
	const isWrong = asked !== undefined && !sameWidth(widthHz, asked);
	const width = isWrong ? widthHz * between(random, 0.93, 1.07) : widthHz;
	return {
		...request,
		centreHz: centreHz + between(random, -0.01, 0.01) * width,
		widthHz: width
	} as BenchRequest;
}
