/** Progress on stderr: one line that changes on a terminal, else a line at every tenth. */
export function progressOf(total: number, what: string): (done: number) => void {
	const startedAt = performance.now();
	let tenth = 0;
	return (done) => {
		const text = `${done} of ${total} ${what}, ${((performance.now() - startedAt) / 1000).toFixed(0)} s`;
		if (process.stderr.isTTY) process.stderr.write(`\r${text}${done === total ? '\n' : ''}`);
		else if (Math.floor((10 * done) / total) > tenth) {
			tenth = Math.floor((10 * done) / total);
			process.stderr.write(`${text}\n`);
		}
	};
}
