/** The levels a finding's plot shows: from just above the highest thing worth seeing to the foot of the sweep. */

/**
 * @param levelsDbm every trace drawn; @param marksDbm levels that must be seen whatever they are
 * @returns top and bottom in dBm, and the highest round level line
 */
export function findingWindow(
	levelsDbm: readonly ArrayLike<number>[],
	marksDbm: readonly number[]
): { topDbm: number; bottomDbm: number; referenceDbm: number } {
	let highest = -Infinity;
	for (const levels of levelsDbm)
		for (let i = 0; i < levels.length; i++) highest = Math.max(highest, levels[i]);
	const least = marksDbm.length > 0 ? Math.min(...marksDbm) : Infinity;
	for (const mark of marksDbm) highest = Math.max(highest, mark);
	if (highest === -Infinity) highest = 0;
	const topDbm = Math.ceil((highest + 8) / 10) * 10 || 0;
	const sweepFoot = footOf(levelsDbm[0]);
	const bottomDbm = Math.max(
		topDbm - 120,
		Math.min(topDbm - 60, Math.floor((Math.min(sweepFoot, least) - 6) / 10) * 10)
	);
	return { topDbm, bottomDbm, referenceDbm: Math.floor(topDbm / 20) * 20 || 0 };
}

/** The level that nine tenths of a trace lie above. */
function footOf(levels: ArrayLike<number> | undefined): number {
	if (!levels || levels.length === 0) return Infinity;
	const sorted = Float32Array.from(levels).sort();
	return sorted[Math.floor(sorted.length / 10)];
}
