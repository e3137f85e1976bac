/** One change to a set-up as typed. */
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';

const tuning = ['centreHz', 'spanHz', 'startHz', 'stopHz'] as const;
type Tuning = (typeof tuning)[number];
const partner: Record<Tuning, Tuning> = {
	centreHz: 'spanHz',
	spanHz: 'centreHz',
	startHz: 'stopHz',
	stopHz: 'startHz'
};
const isTuning = (field: keyof Settings): field is Tuning => (tuning as readonly string[]).includes(field);

/**
 * The set-up with one field changed. Centre and span stand as a pair, start and stop as the other: typing one of a pair
 * puts that pair in force, its partner as it is now. A whole span is never changed by a new centre.
 */
export function applySetting<K extends keyof Settings>(
	settings: Settings,
	resolved: ResolvedSettings,
	field: K,
	value: Settings[K]
): Settings {
	if (!isTuning(field)) return { ...settings, [field]: value };
	const rest = Object.fromEntries(
		Object.entries(settings).filter(([key]) => !isTuning(key as keyof Settings))
	);
	const other = partner[field];
	return { ...rest, [field]: value, [other]: resolved[other] };
}

export const autoFields = ['rbwHz', 'vbwHz', 'sweepTimeS', 'detector', 'attenuationDb'] as const;
export type AutoField = (typeof autoFields)[number];

/** Hands a field to automatic coupling, or takes it back by hand at the value coupling had chosen. */
export const setAuto = (
	settings: Settings,
	resolved: ResolvedSettings,
	field: AutoField,
	auto: boolean
): Settings => ({
	...settings,
	[field]: auto ? 'auto' : resolved[field]
});

/**
 * What the receiver will very likely show for a set-up that is still on its way: the numbers typed over those in force.
 * Couplings are left to the receiver.
 */
export function expectedSettings(resolved: ResolvedSettings, wanted: Settings | undefined): ResolvedSettings {
	if (!wanted) return resolved;
	const typed = Object.entries(wanted).filter(([, value]) => value !== undefined && value !== 'auto');
	const expected: ResolvedSettings = {
		...resolved,
		...Object.fromEntries(typed),
		traces: resolved.traces,
		input: { ...resolved.input, ...wanted.input }
	};
	if (wanted.startHz !== undefined && wanted.stopHz !== undefined) {
		expected.centreHz = (wanted.startHz + wanted.stopHz) / 2;
		expected.spanHz = wanted.stopHz - wanted.startHz;
	} else {
		expected.startHz = expected.centreHz - expected.spanHz / 2;
		expected.stopHz = expected.centreHz + expected.spanHz / 2;
	}
	return expected;
}
