import type { ResolvedSettings } from '$lib/schemas/settings';

const heldOver = ({ traces: _, referenceDbm: __, ...rest }: ResolvedSettings): string => JSON.stringify(rest);

/** Whether holds and averages start again: on any change but of the traces themselves and the reference level. */
export const restartsTraces = (before: ResolvedSettings, after: ResolvedSettings): boolean =>
	heldOver(before) !== heldOver(after);
