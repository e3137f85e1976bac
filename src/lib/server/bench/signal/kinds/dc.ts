import type { EmitterOf } from '$lib/schemas/scene';
import type { EmitterKind } from '../emitter-kind';

/** A direct voltage at the connector: nothing to see, but it harms an input without a block. */
export const dc: EmitterKind<EmitterOf<'dc'>> = {
	kind: 'dc',
	behaviour: () => 'lines',
	meanPowerMw: () => 0,
	peakPowerMw: () => 0,
	lines: () => []
};
