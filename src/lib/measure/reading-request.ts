/** What can be asked of a trace. `schemas/reading.ts` holds the same shapes for the wire; a test keeps the two equal. */

export type Side = 'lower' | 'upper';
export interface OffsetChannel {
	/** Centre of the channel from the centre of the carrier; positive, both sides are read. */
	offsetHz: number;
	widthHz: number;
}
export interface LimitSegment {
	startHz: number;
	stopHz: number;
	levelDbm: number;
}

export type ReadingRequest =
	/** Exactly one of the two; `atS` in span 0. */
	| { kind: 'marker'; atHz?: number; atS?: number }
	/** Either both frequencies or, in span 0, both times. */
	| { kind: 'delta'; fromHz?: number; toHz?: number; fromS?: number; toS?: number }
	| { kind: 'peak' }
	| {
			kind: 'next-peak';
			fromHz: number;
			side: Side;
			/** Peaks below this don't count; absent: crests of the noise don't. */
			thresholdDbm?: number;
			/** How far the trace must fall on both sides of a peak, dB; absent: 6. */
			excursionDb?: number;
	  }
	| { kind: 'minimum' }
	| { kind: 'noise-density'; atHz: number }
	| { kind: 'band-power'; startHz: number; stopHz: number }
	| { kind: 'channel-power'; centreHz: number; widthHz: number }
	| { kind: 'power-density'; centreHz: number; widthHz: number }
	/** Inside a window, or over the whole span when neither is given. */
	| { kind: 'occupied-bandwidth'; centreHz?: number; widthHz?: number; percent: number }
	| { kind: 'x-db-bandwidth'; db: number }
	| {
			kind: 'adjacent-channel';
			centreHz: number;
			widthHz: number;
			offsets: OffsetChannel[];
			/** Weights every channel with a root-raised-cosine filter of symbol rate `widthHz`. */
			rrcRollOff?: number;
	  }
	/** `count` harmonics above the fundamental: n = 2 … count + 1. */
	| { kind: 'harmonics'; fundamentalHz: number; count: number }
	| { kind: 'thd'; fundamentalHz: number; count: number }
	| { kind: 'intercept'; lowerHz: number; upperHz: number }
	| { kind: 'carrier-to-noise'; carrierHz: number; widthHz: number; noiseHz: number }
	/** Offset of either sign, not 0. */
	| { kind: 'phase-noise'; carrierHz: number; offsetHz: number }
	| { kind: 'am-depth'; carrierHz: number }
	| { kind: 'fm-deviation'; carrierHz: number }
	| { kind: 'pulse'; carrierHz: number }
	| { kind: 'time' }
	| { kind: 'mask'; limits: LimitSegment[] };

export type ReadingKind = ReadingRequest['kind'];
export type RequestOf<K extends ReadingKind> = Extract<ReadingRequest, { kind: K }>;
