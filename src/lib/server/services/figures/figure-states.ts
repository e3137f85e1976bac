import type { Figure, FigureChoice } from '$lib/schemas/figure';
import type { FigureState } from '$lib/schemas/figure-view';
import { startValues } from '$lib/server/bench/figure/choices';
import { computeFigure } from '$lib/server/bench/figure/compute-figure';
import { LeastRecentlyUsed } from '../process/least-recently-used';

/** A figure of a unit. Editions never change, so these two names say all. */
export interface PlacedFigure {
	unitId: number;
	figure: Figure;
}

// Only a cache: any process makes any entry again. Some ten kilobytes each.
const states = new LeastRecentlyUsed<string, FigureState>(1500);
const keyOf = ({ unitId, figure }: PlacedFigure, values: readonly FigureChoice[]): string =>
	`${unitId} ${figure.id} ${JSON.stringify(values)}`;

/**
 * The figure at these choices, all of which it offers.
 * @param beforeMaking is called when it has to be made first, and may refuse by throwing
 */
export const figureState = (
	placed: PlacedFigure,
	values: readonly FigureChoice[],
	beforeMaking: () => void = () => undefined
): FigureState =>
	states.get(keyOf(placed, values), () => {
		beforeMaking();
		return computeFigure(placed.figure, values);
	});

/** The figure as it stands when the page is opened. */
export const firstState = (placed: PlacedFigure): FigureState =>
	figureState(placed, startValues(placed.figure));
