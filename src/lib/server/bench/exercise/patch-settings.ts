import type { Settings } from '$lib/schemas/settings';

const PAIRS = [
	['centreHz', 'spanHz'],
	['startHz', 'stopHz']
] as const;

/** `current` with `changes` typed over it. Typing centre or span lets go of start and stop, and the other way about. */
export function patchSettings(current: Settings, changes: Settings): Settings {
	const next = { ...current, ...changes };
	PAIRS.forEach((pair, i) => {
		const other = PAIRS[1 - i];
		if (pair.some((key) => changes[key] !== undefined)) for (const key of other) delete next[key];
	});
	return next;
}
