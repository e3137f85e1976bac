/** What an antenna adds to levels on their way to the plot: its factor, frequency by frequency. */
import { antennaDb, type LevelScale } from './level-scale';

export interface Lift {
	/** The same array where nothing is added. */
	trace: (levelsDbm: ArrayLike<number>) => ArrayLike<number>;
	level: (levelDbm: number, atHz: number) => number;
}

const none: Lift = { trace: (levelsDbm) => levelsDbm, level: (levelDbm) => levelDbm };

/** @param axis the window on show; over time there is one frequency, and its ends are no frequencies */
export function liftOf(
	scale: LevelScale,
	axis: { kind: 'frequency' | 'time'; start: number; stop: number; centreHz: number }
): Lift {
	if (scale.unit !== 'dBµV/m' || !scale.antenna) return none;
	if (axis.kind === 'time') {
		const db = antennaDb(scale, axis.centreHz);
		return {
			trace: (levels) => Float32Array.from(levels, (level) => level + db),
			level: (level) => level + db
		};
	}
	let factors = new Float32Array(0);
	return {
		trace: (levels) => {
			if (factors.length !== levels.length) {
				const step = (axis.stop - axis.start) / Math.max(1, levels.length - 1);
				factors = Float32Array.from(levels, (_, i) => antennaDb(scale, axis.start + i * step));
			}
			return Float32Array.from(levels, (level, i) => level + factors[i]);
		},
		level: (level, atHz) => level + antennaDb(scale, atHz)
	};
}
