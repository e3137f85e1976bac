import type { Figure } from '$lib/schemas/figure';
import type { FigureState, FigureView } from '$lib/schemas/figure-view';

/** A figure as a page shows it: what may be turned and what is read, and never the scene. */
export const presentFigure = (
	{ id, caption, controls, readings, rangeDb }: Figure,
	start: FigureState
): FigureView => ({ id, caption, controls, readings, rangeDb, start });
