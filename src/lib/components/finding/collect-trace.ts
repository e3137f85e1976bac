/** The trace that an answer rested on, made again from the rows the server keeps. */
import { combineRows } from '$lib/measure/combine-rows';
import type { FindingPlot } from '$lib/schemas/questions/finding';
import type { Frame } from '$lib/schemas/frames';

/**
 * Combines the rows of a stream as that trace did.
 * @returns levels in dBm; empty when none of the rows was drawn
 */
export async function collectTrace(
	batches: AsyncIterable<Frame[]>,
	trace: NonNullable<FindingPlot['trace']>
): Promise<Float32Array> {
	const rows: Float32Array[] = [];
	for await (const frames of batches) {
		for (const frame of frames) if (frame.type === 'piece' && frame.last) rows.push(frame.levelsDbm);
	}
	if (rows.length === 0) return new Float32Array();
	return combineRows(rows, trace.mode, trace.count, trace.scale);
}
