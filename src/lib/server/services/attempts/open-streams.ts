/** The sweep streams of this process, so that it can end them before it goes. Each is told by its own abort. */
const open = new Set<AbortController>();

/** Registers a stream. `release` must be called when it is over. */
export function registerStream(): { stopping: AbortSignal; release: () => void } {
	const controller = new AbortController();
	open.add(controller);
	return { stopping: controller.signal, release: () => open.delete(controller) };
}

/** Ends every stream with `server-stopping`: their readers ask again, of whichever process is there. */
export function endStreams(): void {
	for (const controller of open) controller.abort();
}

/** How many streams this process is sending. */
export const countStreams = (): number => open.size;
