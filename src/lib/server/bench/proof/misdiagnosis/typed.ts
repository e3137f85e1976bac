import type { NumberQuestion } from '$lib/server/bench/exercise/drawn-exercise';
import type { Random } from '$lib/server/bench/receiver/random';

/**
 * A number as people type it: to the decimals asked, now and then one more or one fewer where that keeps what the tolerance
 * needs; of what isn't a level, often three significant digits.
 */
export function typed(value: number, question: NumberQuestion, random: Random): number {
	const { digits, tolerance, unit } = question;
	const habit = random.uniform();
	const toDigits = (decimals: number) => Math.round(value * 10 ** decimals) / 10 ** decimals;
	if (!unit.startsWith('dB')) {
		const short = Number(value.toPrecision(3));
		return habit < 0.5 && Math.abs(short - value) <= tolerance / 3 ? short : toDigits(digits);
	}
	if (habit < 0.15) return toDigits(digits + 1);
	if (habit < 0.3 && 0.5 * 10 ** (1 - digits) <= tolerance / 4) return toDigits(digits - 1);
	return toDigits(digits);
}
