/** A cache of at most `capacity` entries that forgets the one unused for longest. Only ever a cache: losing it costs time. */
export class LeastRecentlyUsed<K, V> {
	readonly #entries = new Map<K, V>();

	constructor(readonly capacity: number) {}

	/** What `key` holds, made by `make` if it holds nothing. */
	get(key: K, make: () => V): V {
		const value = this.#entries.has(key) ? (this.#entries.get(key) as V) : make();
		this.#entries.delete(key);
		this.#entries.set(key, value);
		if (this.#entries.size > this.capacity) {
			for (const oldest of this.#entries.keys()) {
				this.#entries.delete(oldest);
				break;
			}
		}
		return value;
	}

	forget(key: K): void {
		this.#entries.delete(key);
	}
}
