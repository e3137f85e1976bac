/** Sources that come and go during a row of long buckets: bursts of lines, and gated densities. */
import type { RowContext } from './contribution';
import type { Frame } from './frame';
import type { IncidentLine, IncidentNoise } from './incident';
import { passing } from './line-contribution';
import type { PassingLine } from './line-response';
import type { Seed } from './random';
import { Schedule } from './schedule';

/** One burst of a row, times from the sweep's start. */
export interface Burst {
	startS: number;
	stopS: number;
	line: PassingLine;
}

/** One stretch of a gated density. */
export interface NoiseStretch {
	startS: number;
	stopS: number;
	variance(tunedHz: number): number;
}

export class TimedSources {
	private readonly lines: { line: IncidentLine; schedule: Schedule }[];
	private readonly noises: { noise: IncidentNoise; schedule: Schedule }[];
	bursts: Burst[] = [];
	stretches: NoiseStretch[] = [];

	constructor(
		private readonly frame: Frame,
		lines: IncidentLine[],
		noises: IncidentNoise[],
		seed: Seed
	) {
		this.lines = lines.map((line) => ({ line, schedule: new Schedule(line.timing!, seed) }));
		this.noises = noises.map((noise) => ({ noise, schedule: new Schedule(noise.timing!, seed) }));
	}

	/** Lists everything of one row, in order of start. */
	start(row: RowContext): void {
		const { frame } = this;
		const margin = 4 / frame.rbwHz;
		const fromS = row.clockS - margin;
		const toS = row.clockS + frame.points * frame.bucketS + margin;
		this.bursts = this.lines.flatMap(({ line, schedule }) => {
			const known = new Map<number | undefined, PassingLine>();
			return schedule.stretches(fromS, toS).map((s) => {
				let pass = known.get(s.channelHz);
				if (!pass) known.set(s.channelHz, (pass = passing(line, frame, row.clockS, s.channelHz)));
				return { startS: s.startS - row.clockS, stopS: s.stopS - row.clockS, line: pass };
			});
		});
		if (this.lines.length > 1) this.bursts.sort((a, b) => a.startS - b.startS);
		this.stretches = this.noises.flatMap(({ noise, schedule }) =>
			schedule.stretches(fromS, toS).map((s) => {
				const drift = (noise.timing!.driftHzPerS ?? 0) * row.clockS;
				const shift = (s.channelHz ?? noise.centreHz ?? 0) - (noise.centreHz ?? s.channelHz ?? 0) + drift;
				return {
					startS: s.startS - row.clockS,
					stopS: s.stopS - row.clockS,
					variance: (f: number) => noise.variance(f - shift)
				};
			})
		);
		// noise shorter than the filter's memory rides on a burst that outshines it (a pulse's own phase noise)
		this.stretches = this.stretches.filter((s) => (s.stopS - s.startS) * frame.rbwHz >= 1);
		this.stretches.sort((a, b) => a.startS - b.startS);
	}
}

/** Members of a list sorted by start that touch fromS…toS. `cursor.at` only moves forward while the list's stretches end in order. */
export function touching<T extends { startS: number; stopS: number }>(
	list: T[],
	cursor: { at: number },
	fromS: number,
	toS: number
): T[] {
	while (cursor.at < list.length && list[cursor.at].stopS <= fromS) cursor.at++;
	const found: T[] = [];
	for (let i = cursor.at; i < list.length && list[i].startS < toS; i++)
		if (list[i].stopS > fromS) found.push(list[i]);
	return found;
}
