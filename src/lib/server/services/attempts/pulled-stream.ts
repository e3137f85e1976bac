/**
 * A byte stream that asks its source for more only when its reader does. When the reader leaves, `gone` aborts,
 * and the source must come to its end. A source that throws is logged here, for the status has long been sent; its reader
 * sees the stream break off.
 * @param over called once, when the source has ended in whatever way
 */
export function pulledStream(
	source: (gone: AbortSignal) => AsyncGenerator<Uint8Array>,
	over: () => void
): ReadableStream<Uint8Array> {
	const reader = new AbortController();
	const chunks = source(reader.signal);
	return new ReadableStream<Uint8Array>(
		{
			async pull(controller) {
				try {
					const { done, value } = await chunks.next();
					// a reader that left while this frame was made has closed the stream already
					if (!done) return reader.signal.aborted ? undefined : controller.enqueue(value);
				} catch (cause) {
					over();
					const text = cause instanceof Error ? (cause.stack ?? cause.message) : String(cause);
					console.error(
						JSON.stringify({ at: new Date().toISOString(), what: 'stream broke off', cause: text })
					);
					throw cause;
				}
				over();
				if (!reader.signal.aborted) controller.close();
			},
			async cancel() {
				reader.abort();
				await chunks.return(undefined);
				over();
			}
		},
		{ highWaterMark: 1 }
	);
}
