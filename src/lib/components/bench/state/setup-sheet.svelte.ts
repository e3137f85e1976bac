/** The set-up strip's side of a set-up: changes on their way, and what was refused, kept as it was typed. */
import type { ResolvedSettings, Settings } from '$lib/schemas/settings';
import { applySetting, expectedSettings, setAuto, type AutoField } from '../setup/apply-setting';
import type { FieldRefusal } from '../setup/refusal';
import { settingWords } from '../setup/setup-words';
import { Refusal } from './bench-wire';
import type { SweepRun } from './sweep-run.svelte';

/** How long a stepped value waits for the next step, ms. */
const stepPauseMs = 90;

export class SetupSheet {
	refusals = $state.raw<Readonly<Record<string, FieldRefusal>>>({});
	/** Something failed that belongs to no field. */
	trouble = $state<string | undefined>();
	readonly #run: SweepRun;
	/** The latest set-up asked for: changes made while one is on its way build on it. */
	#wanted = $state.raw<Settings | undefined>();
	#stepTimer: ReturnType<typeof setTimeout> | undefined;

	constructor(run: SweepRun) {
		this.#run = run;
	}

	/** The set-up the next change builds on. */
	get current(): Settings {
		return this.#wanted ?? this.#run.settings;
	}

	/** The set-up in force, with what is on its way already in its place. */
	get expected(): ResolvedSettings {
		return expectedSettings(this.#run.resolved, this.#wanted);
	}

	/** Sets one field to a value that was typed as `text`. */
	set<K extends keyof Settings>(field: K, value: Settings[K], text: string): Promise<void> {
		return this.#ask(applySetting(this.current, this.expected, field, value), field, text);
	}

	/** Sets one field as `set` does, once no further step has come for a moment: a held arrow key asks once. */
	step<K extends keyof Settings>(field: K, value: Settings[K], text: string): void {
		this.#wanted = applySetting(this.current, this.expected, field, value);
		this.drop(field);
		clearTimeout(this.#stepTimer);
		this.#stepTimer = setTimeout(() => void this.#ask(this.current, field, text), stepPauseMs);
	}

	setAuto(field: AutoField, auto: boolean): Promise<void> {
		return this.#ask(setAuto(this.current, this.expected, field, auto), field, '');
	}

	/** Sets several fields at once: what starting a reading or following a remedy does. */
	setAll(changes: Partial<Settings>): Promise<void> {
		return this.#ask({ ...this.current, ...changes }, Object.keys(changes)[0], '');
	}

	refuse(field: string, text: string, message: string): void {
		this.refusals = { ...this.refusals, [field]: { text, message } };
	}

	drop(field: string): void {
		this.refusals = Object.fromEntries(Object.entries(this.refusals).filter(([key]) => key !== field));
	}

	async #ask(settings: Settings, field: string, text: string): Promise<void> {
		clearTimeout(this.#stepTimer);
		this.#wanted = settings;
		this.drop(field);
		this.trouble = undefined;
		try {
			await this.#run.change(settings);
		} catch (error) {
			if (!(error instanceof Refusal)) throw error;
			if (error.issues.length === 0) this.trouble = error.message;
			else this.refuse(field, text, reasonFor(field, error));
		} finally {
			// A step typed while this was on its way is wanted still, though it has not been asked for yet.
			if (this.#wanted === settings) this.#wanted = undefined;
		}
	}
}

/** The receiver's reason; where it speaks of another field than the one that was typed, with that field's name. */
function reasonFor(field: string, refusal: Refusal): string {
	return refusal.issues
		.map((issue) => {
			const about = issue.field.replace(/^settings\.?/, '').split('.')[0];
			const message = /[.!?]$/.test(issue.message) ? issue.message : `${issue.message}.`;
			return about === field || !settingWords[about]
				? capital(message)
				: `${settingWords[about]}: ${message}`;
		})
		.join(' ');
}

/** Why a whole set-up was refused: each field by its name. */
export const refusedSetUp = (refusal: Refusal): string =>
	refusal.issues.length === 0 ? refusal.message : reasonFor('', refusal);

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
