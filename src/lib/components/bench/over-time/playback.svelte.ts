/** Plays recorded sweeps back: step, play, speed. The receiver rests meanwhile. */
import type { Recording } from './recording';
import { TraceReplay } from './trace-replay';

/** Bench seconds a real second. */
export const speeds = [0.25, 1, 4, 16] as const;
export type Speed = (typeof speeds)[number];
/** However long a sweep took, its picture changes after this real time at the latest, s. */
const longestStepS = 1.5;

export class Playback {
	recording = $state.raw<Recording | undefined>();
	/** Of the sweep that is shown, in the recording. */
	index = $state(0);
	playing = $state(false);
	speed = $state<Speed>(1);
	#replay: TraceReplay | undefined;
	#frame: number | undefined;
	/** Real time that belongs to the sweep shown and has passed, s. */
	#waitedS = 0;

	readonly tracesDbm = $derived.by(() => {
		const { index } = this;
		return this.recording && this.#replay ? this.#replay.after(index) : [];
	});

	/** Shows a recording, its newest sweep first. */
	open(recording: Recording, index = recording.rows.length - 1): void {
		this.pause();
		this.#replay = new TraceReplay(recording);
		this.recording = recording;
		this.index = index;
	}

	close(): void {
		this.pause();
		this.recording = undefined;
		this.#replay = undefined;
	}

	/** Goes so many sweeps on, or back when negative; stops at the ends. */
	step(count: number): void {
		this.pause();
		this.show(this.index + count);
	}

	show(index: number): void {
		const last = (this.recording?.rows.length ?? 1) - 1;
		this.index = Math.min(last, Math.max(0, Math.round(index)));
		this.#waitedS = 0;
	}

	/** Plays on from here; from the first sweep when the newest is shown. */
	play(): void {
		if (!this.recording || this.playing) return;
		if (this.index >= this.recording.rows.length - 1) this.show(0);
		this.playing = true;
		let beforeMs = performance.now();
		const tick = (nowMs: number) => {
			this.#advance((nowMs - beforeMs) / 1000);
			beforeMs = nowMs;
			if (this.playing) this.#frame = requestAnimationFrame(tick);
		};
		this.#frame = requestAnimationFrame(tick);
	}

	pause(): void {
		this.playing = false;
		if (this.#frame !== undefined) cancelAnimationFrame(this.#frame);
		this.#frame = undefined;
	}

	#advance(passedS: number): void {
		const rows = this.recording?.rows ?? [];
		let { index } = this;
		this.#waitedS += Math.max(0, passedS);
		while (index < rows.length - 1) {
			const benchS = rows[index + 1].clockS - rows[index].clockS;
			const stepS = Math.min(longestStepS, benchS / this.speed);
			if (this.#waitedS < stepS) break;
			this.#waitedS -= stepS;
			index += 1;
		}
		this.index = index;
		if (index >= rows.length - 1) this.pause();
	}
}
