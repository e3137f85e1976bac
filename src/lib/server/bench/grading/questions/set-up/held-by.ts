import type { DrawnCondition } from '$lib/server/bench/exercise/drawn-exercise';
import { overloads } from '$lib/server/bench/grading/mixer';
import { correctionAt } from '$lib/server/bench/grading/evidence';
import { ownNoiseDbm, ownProductsDb, shownDbm } from './own-levels';
import {
	decibels,
	frequency,
	namesOf,
	SETTING_NAMES,
	settingText,
	settingValue,
	span
} from './setting-words';
import type { SweptSetUp } from './set-up-at';

/** Whether a set-up holds a condition, in words: what was asked, and what was found. */
export interface Held {
	id: string;
	asked: string;
	found: string;
	met: boolean;
}
type Said = Omit<Held, 'id'>;
/** Numbers that were typed and numbers that were computed agree to this share. */
const SAME = 1e-9;
const atMost = (value: number, limit: number): boolean => value <= limit + SAME * Math.abs(limit);

/** What a set-up is like, condition by condition. */
export const heldBy = (conditions: readonly DrawnCondition[], setUp: SweptSetUp): Held[] =>
	conditions.map((condition) => ({ id: condition.id, ...said(condition, setUp) }));

function said(condition: DrawnCondition, setUp: SweptSetUp): Said {
	const { resolved, drawn } = setUp;
	switch (condition.kind) {
		case 'setting-within': {
			const { setting, atLeast, atMost: most } = condition;
			const value = settingValue(resolved, setting);
			const write = (number: number) => settingText(setting, number);
			return {
				asked: `${SETTING_NAMES[setting]} ${span(atLeast, most, write)}`,
				found: write(value),
				met: (atLeast === undefined || atMost(atLeast, value)) && (most === undefined || atMost(value, most))
			};
		}
		case 'detector-is':
			return isOneOf('detector', condition.is, resolved.detector);
		case 'scale-is':
			return isOneOf('averages on', condition.is, resolved.scale);
		case 'trace-is': {
			const asked = [condition.is].flat();
			const trace = resolved.traces.find(({ mode }) => asked.includes(mode)) ?? resolved.traces[0];
			const held =
				trace.mode === 'average'
					? Math.min(trace.count, setUp.sweeps)
					: trace.mode === 'live'
						? 1
						: setUp.sweeps;
			const { sweeps } = condition;
			return {
				asked: `a trace that shows ${namesOf(asked)}${sweeps === undefined ? '' : ` of at least ${sweeps} sweeps`}`,
				found: `${namesOf([trace.mode])} of ${held}`,
				met: asked.includes(trace.mode) && (sweeps === undefined || held >= sweeps)
			};
		}
		case 'preamp-is':
			return isOneOf('preamplifier', condition.on ? 'on' : 'off', resolved.preamp ? 'on' : 'off');
		case 'dc-block-is':
			return isOneOf('DC block', condition.in ? 'in' : 'out', resolved.input.dcBlock ? 'in' : 'out');
		case 'correction-within': {
			const { atHz, atLeast, atMost: most } = condition;
			const value = correctionAt(resolved.correctionDb, atHz);
			return {
				asked: `correction at ${frequency(atHz)} ${span(atLeast, most, decibels)}`,
				found: decibels(value),
				met: atMost(atLeast, value) && atMost(value, most)
			};
		}
		case 'in-view': {
			const { fromHz, toHz, freeShare = 0 } = condition;
			const freeHz = freeShare * resolved.spanHz;
			return {
				asked: `${frequency(fromHz)} to ${frequency(toHz)} on the screen${freeShare > 0 ? ', with room beside it' : ''}`,
				found: `${frequency(resolved.startHz)} to ${frequency(resolved.stopHz)}`,
				met: atMost(resolved.startHz + freeHz, fromHz) && atMost(toHz, resolved.stopHz - freeHz)
			};
		}
		case 'unhurried':
			return {
				asked: `sweep time ${span(resolved.autoSweepTimeS, undefined, (s) => settingText('sweepTimeS', s))}`,
				found: settingText('sweepTimeS', resolved.sweepTimeS),
				met: atMost(resolved.autoSweepTimeS, resolved.sweepTimeS)
			};
		case 'no-overload': {
			const met = !overloads(setUp, resolved);
			return { asked: 'no overload', found: met ? 'none' : 'the mixer is overloaded', met };
		}
		case 'own-noise-below': {
			const { atHz, levelDbm, db } = condition;
			const belowDb = shownDbm(drawn, resolved, atHz, levelDbm) - ownNoiseDbm(drawn.profile, resolved, atHz);
			return {
				asked: `own noise at least ${decibels(db)} below what is looked for`,
				found: below(belowDb),
				met: resolved.input.connected && belowDb >= db
			};
		}
		case 'own-products-below': {
			const { atHz, toneDbm, db } = condition;
			const belowDb = ownProductsDb(drawn, resolved, atHz, toneDbm);
			return {
				asked: `own third-order products at least ${decibels(db)} below the tones`,
				found: Number.isFinite(belowDb) ? below(belowDb) : 'none',
				met: belowDb >= db
			};
		}
	}
}

const isOneOf = (name: string, asked: string | string[], found: string): Said => ({
	asked: `${name} ${namesOf([asked].flat())}`,
	found: namesOf([found]),
	met: [asked].flat().includes(found)
});

const below = (db: number): string => (db >= 0 ? `${decibels(db)} below` : `${decibels(-db)} above`);
