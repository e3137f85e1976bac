/** Lets `width` pieces of work run at once; the others wait their turn, first come first served. */
export function createGate(width: number): <T>(work: () => Promise<T>) => Promise<T> {
	const waiting: (() => void)[] = [];
	let running = 0;

	return async (work) => {
		if (running < width) running += 1;
		else await new Promise<void>((enter) => waiting.push(enter));
		try {
			return await work();
		} finally {
			// The place is handed on, not given up, or a newcomer could take it first.
			const next = waiting.shift();
			if (next) next();
			else running -= 1;
		}
	};
}
