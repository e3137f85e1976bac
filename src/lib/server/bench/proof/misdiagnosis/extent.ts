import type { BenchRequest } from '$lib/schemas/reading';
import type { FilledStep } from '$lib/server/bench/exercise/drawn-exercise';

/** What of the frequency axis the readings of a method need in view; `whole` where one reads whatever is in view. */
export interface Extent {
	lowHz: number;
	highHz: number;
	whole: boolean;
}

function placesOf(request: BenchRequest): number[] {
	const fields = request as unknown as Record<string, number | undefined>;
	const middleHz = fields.centreHz ?? fields.carrierHz;
	const half = (fields.widthHz ?? 0) / 2;
	const around = middleHz === undefined ? [] : [middleHz - half, middleHz + half];
	const named = ['atHz', 'startHz', 'stopHz', 'fromHz', 'toHz', 'lowerHz', 'upperHz', 'noiseHz'].flatMap(
		(key) => fields[key] ?? []
	);
	const offsets =
		request.kind === 'adjacent-channel'
			? request.offsets.flatMap(({ offsetHz, widthHz }) => [
					request.centreHz - offsetHz - widthHz,
					request.centreHz + offsetHz + widthHz
				])
			: [];
	return [...around, ...named, ...offsets];
}

export function extentOf(steps: readonly FilledStep[]): Extent {
	const requests = steps.flatMap((step) => (step.do === 'read' ? [step.reading] : []));
	const places = requests.map(placesOf);
	return {
		lowHz: Math.min(...places.flat()),
		highHz: Math.max(...places.flat()),
		whole: places.some((of) => of.length === 0) || requests.some(({ kind }) => kind === 'next-peak')
	};
}
