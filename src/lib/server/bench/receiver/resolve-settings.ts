import { unhurriedSweepTimeS } from '$lib/measure/resolution-filter';
import type { ReceiverProfile } from '$lib/schemas/receiver';
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { BenchError } from '../bench-error';
import { resolveAttenuation } from './resolve-attenuation';
import { resolveFrequencies } from './resolve-frequencies';

export const MIN_SWEEP_TIME_S = 1e-4;
export const MAX_SWEEP_TIME_S = 2000;
export const MAX_VBW_HZ = 1e9;
/** Rows an average covers when no count is stated. */
const DEFAULT_COUNT = 100;

/** The step nearest `spanHz`/100 on a logarithmic scale. */
function automaticRbwHz(spanHz: number, rbwStepsHz: readonly number[]): number {
	const away = (rbwHz: number) => Math.abs(Math.log(rbwHz / (spanHz / 100)));
	return rbwStepsHz.reduce((best, rbwHz) => (away(rbwHz) < away(best) ? rbwHz : best));
}

function resolveRbwHz(settings: Settings, profile: ReceiverProfile, spanHz: number): number {
	const { rbwHz = 'auto' } = settings;
	if (rbwHz === 'auto') {
		if (spanHz === 0)
			throw new BenchError(
				'rbwHz',
				'span 0 shows level over time: type a resolution bandwidth, automatic coupling has no span to go by'
			);
		return automaticRbwHz(spanHz, profile.rbwHz);
	}
	if (!profile.rbwHz.includes(rbwHz)) {
		throw new BenchError(
			'rbwHz',
			`must be one of ${profile.rbwHz.join(', ')} Hz or "auto"; given ${rbwHz} Hz`
		);
	}
	return rbwHz;
}

function resolveVbwHz(settings: Settings, rbwHz: number): number {
	const { vbwHz = 'auto' } = settings;
	if (vbwHz === 'auto') return 3 * rbwHz;
	if (!(vbwHz > 0 && vbwHz <= MAX_VBW_HZ)) {
		throw new BenchError('vbwHz', `must be above 0 and at most ${MAX_VBW_HZ} Hz; given ${vbwHz} Hz`);
	}
	return vbwHz;
}

function resolveSweepTimeS(settings: Settings, autoSweepTimeS: number, rbwHz: number, vbwHz: number): number {
	const { sweepTimeS = 'auto' } = settings;
	if (sweepTimeS === 'auto') {
		if (autoSweepTimeS > MAX_SWEEP_TIME_S) {
			const narrow = vbwHz < rbwHz ? `rbwHz ${rbwHz} with vbwHz ${vbwHz}` : `rbwHz ${rbwHz}`;
			throw new BenchError(
				'rbwHz',
				`${narrow} needs a sweep of ${autoSweepTimeS} s here; the limit is ${MAX_SWEEP_TIME_S} s`
			);
		}
		return autoSweepTimeS;
	}
	if (!(sweepTimeS >= MIN_SWEEP_TIME_S && sweepTimeS <= MAX_SWEEP_TIME_S)) {
		throw new BenchError(
			'sweepTimeS',
			`must be ${MIN_SWEEP_TIME_S} to ${MAX_SWEEP_TIME_S} s; given ${sweepTimeS} s`
		);
	}
	return sweepTimeS;
}

/**
 * Settings as typed to settings as the receiver does them: defaults, couplings, refusals. Nothing is clamped.
 * Automatic: RBW the step nearest span/100; VBW 3 RBW; sweep time max(1 ms, 5·span/(RBW·min(RBW, VBW)));
 * attenuation as `resolveAttenuation`; detector rise-fall. A hand-set sweep time below the automatic one is allowed.
 * @param settings entries already of the right type and within their fixed limits (the zod schema)
 * @throws BenchError naming the entry as typed, the limit and the value
 */
export function resolveSettings(settings: Settings, profile: ReceiverProfile): ResolvedSettings {
	const frequencies = resolveFrequencies(settings, profile);
	const { spanHz, centreHz } = frequencies;
	const preamp = settings.preamp ?? false;
	if (preamp && !profile.preamp) {
		throw new BenchError('preamp', `${profile.name} has no preamplifier; given true`);
	}
	const rbwHz = resolveRbwHz(settings, profile, spanHz);
	const vbwHz = resolveVbwHz(settings, rbwHz);
	const autoSweepTimeS = unhurriedSweepTimeS(spanHz, rbwHz, vbwHz);
	const automatic = (value: number | string | undefined) => value === undefined || value === 'auto';
	const detector = settings.detector ?? 'auto';
	return {
		...frequencies,
		points: settings.points ?? 1001,
		rbwHz,
		vbwHz,
		sweepTimeS: resolveSweepTimeS(settings, autoSweepTimeS, rbwHz, vbwHz),
		detector: detector === 'auto' ? 'rise-fall' : detector,
		scale: settings.scale ?? 'log',
		referenceDbm: settings.referenceDbm ?? 0,
		attenuationDb: resolveAttenuation(settings, profile, centreHz),
		preamp,
		correctionDb: settings.correctionDb ?? 0,
		input: {
			connected: settings.input?.connected ?? true,
			padDb: settings.input?.padDb ?? 0,
			dcBlock: settings.input?.dcBlock ?? false
		},
		traces: (settings.traces ?? [{ mode: 'live' }]).map(({ mode, count }) => ({
			mode,
			count: count ?? DEFAULT_COUNT
		})),
		auto: {
			rbwHz: automatic(settings.rbwHz),
			vbwHz: automatic(settings.vbwHz),
			sweepTimeS: automatic(settings.sweepTimeS),
			detector: automatic(settings.detector),
			attenuationDb: automatic(settings.attenuationDb)
		},
		autoSweepTimeS
	};
}
