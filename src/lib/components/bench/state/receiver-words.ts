/** What the receiver is doing, in words with numbers: for the strip over the plot. */
import type { ReceiverFlag } from '$lib/schemas/sweep-stream';
import { formatFigure } from '$lib/units/format-quantity';

export interface Warning {
	kind: ReceiverFlag['kind'] | 'stopped' | 'lost';
	cause: string;
	consequence: string;
	/** Shorter, for a phone. */
	brief: string;
}

/** How much wider a too fast sweep makes a line, from how far it reads low: both are √(1 + k²) of the same chirp. */
export const widerBy = (lowDb: number): number => 10 ** (lowDb / 10);

/** The warning for one flag of the receiver. */
export function warningOf(flag: ReceiverFlag): Warning {
	switch (flag.kind) {
		case 'too-fast': {
			const db = flag.db ?? 0;
			const low = `${formatFigure(db, db < 0.1 ? 2 : 1)} dB`;
			const wide = `${widerBy(db).toFixed(widerBy(db) < 1.1 ? 2 : 1)} times too wide`;
			return {
				kind: flag.kind,
				cause: 'Sweep too fast for this resolution',
				consequence: `single lines read low by about ${low} and ${wide}.`,
				brief: `single lines read low by about ${low}.`
			};
		}
		case 'overload':
			return {
				kind: flag.kind,
				cause: 'Input at the mixer within 3 dB of compression',
				consequence: 'levels read low, and the receiver adds products of its own.',
				brief: 'levels read low, products of the receiver’s own appear.'
			};
		case 'input-protection':
			return {
				kind: flag.kind,
				cause: 'Input protection has opened',
				consequence:
					'too much power, or DC, at the connector. Put a pad, a DC block or the matched load there, then reset.',
				brief: 'put a pad, a DC block or the load at the input, then reset.'
			};
	}
}

/** The warning that matters most: what stops the sweep before what bends it. */
export function foremostWarning(flags: readonly ReceiverFlag[]): Warning | undefined {
	const order: ReceiverFlag['kind'][] = ['input-protection', 'overload', 'too-fast'];
	const flag = order.map((kind) => flags.find((f) => f.kind === kind)).find((f) => f !== undefined);
	return flag && warningOf(flag);
}
