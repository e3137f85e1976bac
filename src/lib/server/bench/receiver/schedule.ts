/** When an emitter is on, and on which channel: gates, hops and pulse trains on the bench clock. */
import type { Timing } from './incident';
import { Random, type Seed } from './random';

/** A stretch of bench time during which an emitter is on at one channel. */
export interface OnStretch {
	startS: number;
	stopS: number;
	/** Channel frequency while hopping, Hz; undefined when the emitter keeps its own. */
	channelHz?: number;
}

/** Makes an emitter's stretches from its timing; seeded parts (gate start, pulse start, hop order) are fixed for an attempt. */
export class Schedule {
	private readonly gateStartS: number;
	private readonly pulseStartS: number;
	private hopCycle = -1;
	private hopOrder: number[] = [];

	constructor(
		private readonly timing: Timing,
		private readonly seed: Seed
	) {
		const random = new Random(seed, -1, `schedule/${timing.emitter}`);
		const gate = random.uniform();
		const pulse = random.uniform();
		this.gateStartS = timing.gate ? (timing.gate.startS ?? gate * (timing.gate.onS + timing.gate.offS)) : 0;
		this.pulseStartS = timing.pulse ? pulse * timing.pulse.periodS : 0;
	}

	/** All stretches that touch fromS…toS, in order, cut to nothing (edges are true edges). */
	stretches(fromS: number, toS: number): OnStretch[] {
		let list: OnStretch[] = [{ startS: -Infinity, stopS: Infinity }];
		if (this.timing.gate) list = this.gated(fromS, toS);
		if (this.timing.hop) list = intersect(list, this.hops(fromS, toS));
		if (this.timing.pulse) list = intersect(list, this.pulses(fromS, toS));
		return list.filter((s) => s.stopS > fromS && s.startS < toS);
	}

	private gated(fromS: number, toS: number): OnStretch[] {
		const { onS, offS } = this.timing.gate!;
		return periodic(this.gateStartS, onS, onS + offS, fromS, toS);
	}

	private pulses(fromS: number, toS: number): OnStretch[] {
		const { widthS, periodS } = this.timing.pulse!;
		return periodic(this.pulseStartS, widthS, periodS, fromS, toS);
	}

	private hops(fromS: number, toS: number): OnStretch[] {
		const { dwellS } = this.timing.hop!;
		const list: OnStretch[] = [];
		for (let i = Math.floor(fromS / dwellS); i * dwellS < toS; i++)
			list.push({ startS: i * dwellS, stopS: (i + 1) * dwellS, channelHz: this.channel(i) });
		return list;
	}

	/** Every cycle visits each channel once, in an order of its own. */
	private channel(dwell: number): number {
		const { channelsHz } = this.timing.hop!;
		const cycle = Math.floor(dwell / channelsHz.length);
		if (cycle !== this.hopCycle) {
			const random = new Random(this.seed, cycle, `hop/${this.timing.emitter}`);
			this.hopCycle = cycle;
			this.hopOrder = channelsHz.map((_, i) => i);
			for (let i = channelsHz.length - 1; i > 0; i--) {
				const j = Math.floor(random.uniform() * (i + 1));
				[this.hopOrder[i], this.hopOrder[j]] = [this.hopOrder[j], this.hopOrder[i]];
			}
		}
		return channelsHz[this.hopOrder[dwell - cycle * channelsHz.length]];
	}
}

function periodic(startS: number, onS: number, periodS: number, fromS: number, toS: number): OnStretch[] {
	const list: OnStretch[] = [];
	for (let i = Math.floor((fromS - startS) / periodS); startS + i * periodS < toS; i++)
		list.push({ startS: startS + i * periodS, stopS: startS + i * periodS + onS });
	return list;
}

/** Overlaps of two ordered lists. */
function intersect(a: OnStretch[], b: OnStretch[]): OnStretch[] {
	const list: OnStretch[] = [];
	for (let i = 0, j = 0; i < a.length && j < b.length;) {
		const startS = Math.max(a[i].startS, b[j].startS);
		const stopS = Math.min(a[i].stopS, b[j].stopS);
		if (stopS > startS) list.push({ startS, stopS, channelHz: a[i].channelHz ?? b[j].channelHz });
		if (a[i].stopS < b[j].stopS) i++;
		else j++;
	}
	return list;
}
