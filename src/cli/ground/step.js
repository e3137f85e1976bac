/**
 * Runs one step of a longer command and prints its name at once, what came of it and how long it took.
 * A dot every five seconds shows that a long one is still at work.
 * @template T
 * @param {string} name
 * @param {() => T | Promise<T>} work returns what to say of it: a string, or an object with a `note`
 * @returns {Promise<T>}
 */
export async function step(name, work) {
	const startedMs = performance.now();
	process.stdout.write(`  ${name.padEnd(12)} `);
	const dots = setInterval(() => process.stdout.write('.'), 5000);
	try {
		const result = await work();
		const seconds = ((performance.now() - startedMs) / 1000).toFixed(1);
		process.stdout.write(`${noteOf(result)} (${seconds} s)\n`);
		return result;
	} catch (error) {
		process.stdout.write('failed\n');
		throw error;
	} finally {
		clearInterval(dots);
	}
}

/** @param {unknown} result */
function noteOf(result) {
	if (typeof result === 'string') return result;
	if (typeof result === 'object' && result !== null && 'note' in result) return String(result.note);
	return 'done';
}
