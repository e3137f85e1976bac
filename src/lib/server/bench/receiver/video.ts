/** From envelope to video: the scale it is judged on, and the one-pole video filter. */
import type { Scale } from '$lib/schemas/settings';
import type { Frame } from './frame';

const LN10_10 = Math.LN10 / 10;
/** Below any power a receiver can show: keeps the logarithm of a perfect null finite (−400 dBm). */
export const LEAST_POWER_MW = 1e-40;

/** Power in mW of each sample put on the scale: ln p, p or √p. In place. */
export function toScale(power: Float64Array, scale: Scale, from: number, to: number): void {
	if (scale === 'log')
		for (let i = from; i < to; i++)
			power[i] = Math.log(power[i] > LEAST_POWER_MW ? power[i] : LEAST_POWER_MW);
	else if (scale === 'voltage') for (let i = from; i < to; i++) power[i] = Math.sqrt(power[i]);
}

/** One power in mW on the scale. */
export function powerOnScale(power: number, scale: Scale): number {
	if (scale === 'power') return power;
	return scale === 'log' ? Math.log(Math.max(power, LEAST_POWER_MW)) : Math.sqrt(power);
}

/** A value on the scale (ln p, p or √p) as a level in dBm. */
export function scaleToDbm(value: number, scale: Scale): number {
	if (scale === 'log') return value / LN10_10;
	const power = scale === 'power' ? value : value * Math.abs(value);
	return Math.log(power > LEAST_POWER_MW ? power : LEAST_POWER_MW) / LN10_10;
}

/** How the video filter stands to the resolution filter: left out (laws hold from 10 B up), followed sample by sample, or far narrower. */
export type VideoKind = 'wide' | 'between' | 'narrow';
export const videoKind = (vbwHz: number, rbwHz: number): VideoKind =>
	vbwHz >= 10 * rbwHz ? 'wide' : vbwHz <= rbwHz / 20 ? 'narrow' : 'between';

/** Run-in after which the one-pole filter has forgotten its start: six time constants, s. */
export const videoRunInS = (vbwHz: number): number => 6 / (2 * Math.PI * vbwHz);

/**
 * One-pole low-pass with −3 dB at vbwHz, exact for a video that is straight between samples. In place; the state starts at `start`.
 */
export function onePole(
	video: Float64Array,
	vbwHz: number,
	stepS: number,
	total: number,
	start: number
): void {
	const tau = 1 / (2 * Math.PI * vbwHz);
	const keep = Math.exp(-stepS / tau);
	const blend = ((1 - keep) * tau) / stepS;
	const before = blend - keep;
	const after = 1 - blend;
	let state = start;
	let x = video[0];
	video[0] = state;
	for (let i = 1; i < total; i++) {
		const next = video[i];
		state = keep * state + before * x + after * next;
		x = next;
		video[i] = state;
	}
}

/** Whether the frame's samples follow the video filter at all. */
export const filtersVideo = (frame: Frame): boolean => videoKind(frame.vbwHz, frame.rbwHz) !== 'wide';
