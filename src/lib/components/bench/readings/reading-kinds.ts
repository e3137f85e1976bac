/** The readings a person can start from the menu: what each is called, what it asks for, and where its bracket stands. */
import type { BenchRequest, MaskLimits } from '$lib/schemas/reading';
import type { ResolvedSettings } from '$lib/schemas/settings';

type Kind = BenchRequest['kind'];

/** One blank of a reading's form. */
export interface ReadingField {
	name: string;
	label: string;
	dimension: 'frequency' | 'time' | 'ratio' | 'share' | 'number';
}

/** What the form starts from: the window on show, the selected marker, if any, and the order's limits. */
export interface ReadingContext {
	resolved: ResolvedSettings;
	limits?: MaskLimits;
	markerHz?: number;
	otherMarkerHz?: number;
}

export const readingGroups = ['Power', 'Width', 'Carrier', 'Distortion', 'Limits', 'Time'] as const;
export type ReadingGroup = (typeof readingGroups)[number];

export interface ReadingKind {
	kind: Kind;
	label: string;
	/** One line under the label in the menu. */
	says: string;
	group: ReadingGroup;
	/** Whether it can be asked for here; absent: over frequency. */
	offered?: (context: ReadingContext) => boolean;
	/** Needs the average detector on the power scale; starting it sets both, in the log. */
	power?: true;
	/** Started at once when there are none. */
	fields: readonly ReadingField[];
	/** Values to start the form from, by field name. */
	start: (context: ReadingContext) => Record<string, number>;
	/** The finished request. */
	request: (values: Record<string, number>, context: ReadingContext) => BenchRequest;
	/** Where the bracket stands on the plot; absent when there is none. */
	band?: (values: Record<string, number>) => { start: number; stop: number };
}

const overTime = ({ resolved }: ReadingContext) => resolved.spanHz === 0;
const frequency = (name: string, label: string): ReadingField => ({ name, label, dimension: 'frequency' });
const channelFields = [frequency('centreHz', 'Centre'), frequency('widthHz', 'Width')];
/** A quarter of the window, on a 1-2-5 figure: a width to start typing from, no more. */
const startWidthHz = ({ resolved }: ReadingContext) => {
	const decade = 10 ** Math.floor(Math.log10(Math.max(1, resolved.spanHz / 4)));
	const leading = resolved.spanHz / 4 / decade;
	return (leading >= 5 ? 5 : leading >= 2 ? 2 : 1) * decade;
};
const startHz = ({ resolved, markerHz }: ReadingContext) => markerHz ?? resolved.centreHz;
const channelStart = (context: ReadingContext) => ({
	centreHz: context.resolved.centreHz,
	widthHz: startWidthHz(context)
});
const channelBand = ({ centreHz, widthHz }: Record<string, number>) => ({
	start: centreHz - widthHz / 2,
	stop: centreHz + widthHz / 2
});

export const readingKinds: readonly ReadingKind[] = [
	{
		kind: 'channel-power',
		label: 'Channel power',
		says: 'everything between two edges, added up',
		group: 'Power',
		power: true,
		fields: channelFields,
		start: channelStart,
		request: ({ centreHz, widthHz }) => ({ kind: 'channel-power', centreHz, widthHz }),
		band: channelBand
	},
	{
		kind: 'power-density',
		label: 'Power density',
		says: 'channel power spread evenly over its width, in 1 Hz',
		group: 'Power',
		power: true,
		fields: channelFields,
		start: channelStart,
		request: ({ centreHz, widthHz }) => ({ kind: 'power-density', centreHz, widthHz }),
		band: channelBand
	},
	{
		kind: 'band-power',
		label: 'Band power',
		says: 'the same, from a start to a stop',
		group: 'Power',
		power: true,
		fields: [frequency('startHz', 'From'), frequency('stopHz', 'To')],
		start: (context) => ({
			startHz: context.resolved.centreHz - startWidthHz(context) / 2,
			stopHz: context.resolved.centreHz + startWidthHz(context) / 2
		}),
		request: ({ startHz, stopHz }) => ({ kind: 'band-power', startHz, stopHz }),
		band: ({ startHz, stopHz }) => ({ start: startHz, stop: stopHz })
	},
	{
		kind: 'count',
		label: 'Frequency count',
		says: 'a carrier counted for a gate time, finer than any point',
		group: 'Carrier',
		offered: () => true,
		fields: [frequency('atHz', 'At'), { name: 'gateS', label: 'Gate', dimension: 'time' }],
		start: (context) => ({ atHz: startHz(context), gateS: 0.1 }),
		request: ({ atHz, gateS }) => ({ kind: 'count', atHz, gateS })
	},
	{
		kind: 'noise-density',
		label: 'Noise density',
		says: 'noise around one frequency, in 1 Hz',
		group: 'Power',
		fields: [frequency('atHz', 'At')],
		start: (context) => ({ atHz: startHz(context) }),
		request: ({ atHz }) => ({ kind: 'noise-density', atHz })
	},
	{
		kind: 'adjacent-channel',
		label: 'Adjacent channels',
		says: 'power beside a channel, against its own',
		group: 'Power',
		power: true,
		fields: [...channelFields, frequency('offsetHz', 'Offset'), frequency('besideHz', 'Width beside')],
		start: (context) => {
			const widthHz = startWidthHz(context);
			return { centreHz: context.resolved.centreHz, widthHz, offsetHz: widthHz, besideHz: widthHz };
		},
		request: ({ centreHz, widthHz, offsetHz, besideHz }) => ({
			kind: 'adjacent-channel',
			centreHz,
			widthHz,
			offsets: [{ offsetHz, widthHz: besideHz }]
		}),
		band: channelBand
	},
	{
		kind: 'carrier-to-noise',
		label: 'Carrier to noise',
		says: 'a carrier against the noise in a width',
		group: 'Power',
		fields: [
			frequency('carrierHz', 'Carrier'),
			frequency('noiseHz', 'Noise at'),
			frequency('widthHz', 'Width')
		],
		start: (context) => ({
			carrierHz: startHz(context),
			noiseHz: context.otherMarkerHz ?? context.resolved.startHz + context.resolved.spanHz / 10,
			widthHz: startWidthHz(context)
		}),
		request: ({ carrierHz, noiseHz, widthHz }) => ({ kind: 'carrier-to-noise', carrierHz, noiseHz, widthHz })
	},
	{
		kind: 'occupied-bandwidth',
		label: 'Occupied bandwidth',
		says: 'the width that holds a share of the power',
		group: 'Width',
		power: true,
		fields: [{ name: 'percent', label: 'Share', dimension: 'share' }],
		start: () => ({ percent: 99 }),
		request: ({ percent }) => ({ kind: 'occupied-bandwidth', percent })
	},
	{
		kind: 'x-db-bandwidth',
		label: 'Bandwidth at x dB',
		says: 'the width between points so far below the highest',
		group: 'Width',
		fields: [{ name: 'db', label: 'Below the highest', dimension: 'ratio' }],
		start: () => ({ db: 26 }),
		request: ({ db }) => ({ kind: 'x-db-bandwidth', db })
	},
	{
		kind: 'phase-noise',
		label: 'Phase noise',
		says: 'noise at an offset, in 1 Hz, against its carrier',
		group: 'Carrier',
		fields: [frequency('carrierHz', 'Carrier'), frequency('offsetHz', 'Offset')],
		start: (context) => ({ carrierHz: startHz(context), offsetHz: context.resolved.spanHz / 4 }),
		request: ({ carrierHz, offsetHz }) => ({ kind: 'phase-noise', carrierHz, offsetHz })
	},
	...(['am-depth', 'fm-deviation', 'pulse'] as const).map((kind): ReadingKind => ({
		kind,
		...{
			'am-depth': { label: 'Amplitude modulation', says: 'depth, from the sidebands of a carrier' },
			'fm-deviation': {
				label: 'Frequency deviation',
				says: 'peak deviation, from the sidebands of a carrier'
			},
			pulse: { label: 'Pulse', says: 'width and repetition of a pulsed carrier' }
		}[kind],
		group: 'Carrier',
		fields: [frequency('carrierHz', 'Carrier')],
		start: (context) => ({ carrierHz: startHz(context) }),
		request: ({ carrierHz }) => ({ kind, carrierHz })
	})),
	...(['harmonics', 'thd'] as const).map((kind): ReadingKind => ({
		kind,
		label: kind === 'thd' ? 'Total harmonic distortion' : 'Harmonics',
		says:
			kind === 'thd'
				? 'all harmonics together, against the fundamental'
				: 'each harmonic against the fundamental',
		group: 'Distortion',
		fields: [
			frequency('fundamentalHz', 'Fundamental'),
			{ name: 'count', label: 'How many', dimension: 'number' }
		],
		start: (context) => ({ fundamentalHz: startHz(context), count: 3 }),
		request: ({ fundamentalHz, count }) => ({ kind, fundamentalHz, count: Math.round(count) })
	})),
	{
		kind: 'intercept',
		label: 'Third-order intercept',
		says: 'from two carriers and the products beside them',
		group: 'Distortion',
		fields: [frequency('lowerHz', 'Lower carrier'), frequency('upperHz', 'Upper carrier')],
		start: (context) => ({
			lowerHz: Math.min(startHz(context), context.otherMarkerHz ?? context.resolved.centreHz),
			upperHz: Math.max(startHz(context), context.otherMarkerHz ?? context.resolved.stopHz)
		}),
		request: ({ lowerHz, upperHz }) => ({ kind: 'intercept', lowerHz, upperHz })
	},
	{
		kind: 'mask',
		label: 'Margin to the mask',
		says: 'the least room under the order’s limits',
		group: 'Limits',
		offered: (context) => context.limits !== undefined && !overTime(context),
		fields: [],
		start: () => ({}),
		request: (_, { limits = [] }) => ({ kind: 'mask', limits })
	},
	{
		kind: 'time',
		label: 'Times',
		says: 'on time of what comes and goes, at half its voltage',
		group: 'Time',
		offered: overTime,
		fields: [],
		start: () => ({}),
		request: () => ({ kind: 'time' })
	}
];

/** The kinds that can be asked for with this window, by group; groups without any are left out. */
export const offeredKinds = (context: ReadingContext): { group: ReadingGroup; kinds: ReadingKind[] }[] =>
	readingGroups
		.map((group) => ({
			group,
			kinds: readingKinds.filter(
				(kind) => kind.group === group && (kind.offered?.(context) ?? !overTime(context))
			)
		}))
		.filter(({ kinds }) => kinds.length > 0);

/** The kind's entry; undefined for readings that are markers. */
export const readingKind = (kind: Kind): ReadingKind | undefined =>
	readingKinds.find((entry) => entry.kind === kind);
