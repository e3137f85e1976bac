/** Settings in words, as conditions name them. */
import type { NumberSetting } from '$lib/schemas/questions/condition';
import type { ResolvedSettings } from '$lib/schemas/settings';
import { figure, shortFigure } from '$lib/server/bench/exercise/figure';
import { formatFrequency, formatTime } from '$lib/units/format-quantity';

export const SETTING_NAMES: Record<NumberSetting, string> = {
	centreHz: 'centre',
	spanHz: 'span',
	startHz: 'start',
	stopHz: 'stop',
	points: 'points',
	rbwHz: 'resolution bandwidth',
	vbwHz: 'video bandwidth',
	sweepTimeS: 'sweep time',
	referenceDbm: 'reference',
	attenuationDb: 'attenuation',
	padDb: 'pad'
};

export const settingValue = (resolved: ResolvedSettings, setting: NumberSetting): number =>
	setting === 'padDb' ? resolved.input.padDb : resolved[setting];

export const frequency = formatFrequency;
export const decibels = (db: number): string => `${shortFigure(db, 1)} dB`;

export function settingText(setting: NumberSetting, value: number): string {
	if (setting.endsWith('Hz')) return formatFrequency(value);
	if (setting.endsWith('Dbm')) return `${shortFigure(value, 1)} dBm`;
	if (setting.endsWith('Db')) return decibels(value);
	return setting === 'sweepTimeS' ? formatTime(Number(value.toPrecision(4))) : figure(value, 0);
}

/** "at most 1 kHz", "from 10 dB to 30 dB". */
export function span(
	atLeast: number | undefined,
	atMost: number | undefined,
	write: (value: number) => string
): string {
	if (atLeast === undefined) return `at most ${write(atMost as number)}`;
	if (atMost === undefined) return `at least ${write(atLeast)}`;
	return atLeast === atMost ? write(atLeast) : `from ${write(atLeast)} to ${write(atMost)}`;
}

const WORDS: Partial<Record<string, string>> = {
	log: 'decibels',
	live: 'the last sweep',
	average: 'average',
	'max-hold': 'the held maximum',
	'min-hold': 'the held minimum',
	kept: 'a kept trace'
};
/** Names of settings joined for people: "average or sample". */
export const namesOf = (names: readonly string[]): string =>
	names.map((name) => WORDS[name] ?? name.replaceAll('-', ' ')).join(' or ');
