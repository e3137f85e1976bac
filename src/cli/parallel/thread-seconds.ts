import { readFileSync } from 'node:fs';

/** Processor time that the calling thread has used, s: what Linux counts for it, compilers and collectors on other threads left out. */
export function threadSeconds(): number {
	const [nanoseconds] = readFileSync('/proc/thread-self/schedstat', 'utf8').split(' ');
	return Number(nanoseconds) / 1e9;
}
