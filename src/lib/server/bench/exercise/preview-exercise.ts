import { takeReading } from '$lib/measure/take-reading';
import type { Exercise } from '$lib/schemas/exercise';
import type { FigureState } from '$lib/schemas/figure-view';
import type { SignalPreview } from '$lib/schemas/preview-view';
import { readingRequest, type ReadingRequest } from '$lib/schemas/reading';
import { prepareSweep } from '../receiver/sweep';
import { traceOfRows } from '../receiver/trace-of-rows';
import { drawExercise } from './draw-exercise';
import { numberQuestions, type DrawnExercise } from './drawn-exercise';
import { methodStates } from './method-states';

/** An author is waiting: a held or averaged trace is shown after at most so many sweeps. */
const MOST_SWEEPS = 32;

/**
 * What one seed makes of an exercise: the signal as the taught method first sweeps it, what that reads, and the truths.
 * @throws BenchError when it can't be drawn or swept
 */
export function previewExercise(exercise: Exercise, seed: number): SignalPreview {
	const drawn = drawExercise(exercise, seed);
	const { state, requests } = firstSweep(drawn);
	return {
		seed,
		title: exercise.title,
		redraws: drawn.redraws,
		drawn: Object.entries(drawn.parameters).map(([name, value]) => ({
			name,
			value: String(typeof value === 'number' ? Number(value.toPrecision(9)) : value),
			shown: exercise.shown.includes(name)
		})),
		situation: drawn.brief.situation,
		truths: numberQuestions(drawn).map(({ id, text, truth, unit, digits, tolerance }) => ({
			...{ question: id, text, value: truth, unit, digits, tolerance }
		})),
		requests,
		state
	};
}

function firstSweep(drawn: DrawnExercise): { state: FigureState; requests: ReadingRequest[] } {
	const { method, scene, profile, seed } = drawn;
	const at = Math.max(
		0,
		method.findIndex((step) => step.do === 'sweep')
	);
	const { resolved } = methodStates(drawn, method)[at];
	const step = method[at];
	const sweeps = Math.min(MOST_SWEEPS, step.do === 'sweep' ? step.sweeps : 1);
	const plan = prepareSweep(scene, profile, resolved, seed);
	const rows: Float32Array[] = [];
	let clockS = 0;
	for (let n = 0; n < sweeps && !plan.isProtected; n++) {
		rows.push(plan.row(n, clockS));
		clockS += plan.durationS(n);
	}
	const traces = rows.length === 0 ? [] : resolved.traces.map((_, i) => traceOfRows(rows, resolved, i));
	const requests = requestsAfter(drawn, at);
	return {
		requests,
		state: {
			values: [],
			resolved,
			flags: plan.flags,
			traces: traces.map(({ mode, levelsDbm }) => ({
				mode: mode ?? 'live',
				levelsDbm: Array.from(levelsDbm, (levelDbm) => Math.round(levelDbm * 100) / 100)
			})),
			readings: traces.length === 0 ? [] : requests.map((request) => takeReading(traces[0], request))
		}
	};
}

/** What the method reads off the first trace before it sets anything else. */
function requestsAfter({ method }: DrawnExercise, at: number): ReadingRequest[] {
	const requests: ReadingRequest[] = [];
	for (const step of method.slice(at + 1)) {
		if (step.do === 'set' || step.do === 'sweep') break;
		if (step.do !== 'read' || step.trace !== 1) continue;
		const request = readingRequest.safeParse(step.reading);
		if (request.success) requests.push(request.data);
	}
	return requests;
}
