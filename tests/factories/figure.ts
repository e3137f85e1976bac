import { stringify } from 'yaml';
import type { Figure } from '$lib/schemas/figure';

/** A figure as an author would write it, quick to sweep: a spread carrier through three resolutions. */
const WRITTEN = {
	id: 'hump',
	caption: 'Widen the filter and the hump climbs.',
	receiver: 'field',
	scene: {
		emitters: [
			{ kind: 'digital', frequencyHz: 450e6, levelDbm: -20, symbolRateHz: 16e3, rollOff: 0.35, order: 4 }
		]
	},
	settings: { centreHz: 450e6, spanHz: 60e3, rbwHz: 300, points: 201, detector: 'average', scale: 'power' },
	sweeps: 2,
	seed: 7,
	controls: [{ setting: 'rbwHz', label: 'Resolution', choices: [300, 1000, 3000] }],
	readings: [{ kind: 'channel-power', centreHz: 450e6, widthHz: 25e3 }]
};

/** What an author writes, with some of it said otherwise. */
export const writtenFigure = (
	over: Partial<Record<keyof Figure, unknown>> = {}
): Record<string, unknown> => ({
	...structuredClone(WRITTEN),
	...over
});

/** The same as the block of a lesson. */
export const figureBlock = (over: Partial<Record<keyof Figure, unknown>> = {}): string =>
	`\`\`\`figure\n${stringify(writtenFigure(over))}\`\`\`\n`;
