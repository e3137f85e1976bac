import { afterEach, describe, expect, it, vi } from 'vitest';
import { pulledStream } from '$lib/server/services/attempts/pulled-stream';

afterEach(() => vi.restoreAllMocks());

/** A source of bytes 0, 1, 2 … that notes how far it was asked. */
function counter(stopAt = Infinity, fault?: Error) {
	const seen = { asked: 0, ended: false, overs: 0 };
	async function* source(): AsyncGenerator<Uint8Array> {
		try {
			for (let i = 0; i < stopAt; i++) {
				seen.asked += 1;
				await new Promise((resume) => setTimeout(resume, 1));
				yield Uint8Array.of(i);
			}
			if (fault) throw fault;
		} finally {
			seen.ended = true;
		}
	}
	return { seen, stream: pulledStream(source, () => void (seen.overs += 1)) };
}

describe('pulledStream(source, over)', () => {
	it('asks for no more than its reader does, but for one in hand', async () => {
		const { seen, stream } = counter();
		const reader = stream.getReader();
		await reader.read();
		await new Promise((resume) => setTimeout(resume, 50));
		expect(seen.asked).toBeLessThanOrEqual(2);
		await reader.cancel();
	});

	it('brings its source to an end when the reader leaves', async () => {
		const { seen, stream } = counter();
		const reader = stream.getReader();
		await reader.read();
		await reader.cancel();
		expect(seen).toMatchObject({ ended: true, overs: 1 });
	});

	it('ends with its source', async () => {
		const { seen, stream } = counter(3);
		expect(new Uint8Array(await new Response(stream).arrayBuffer())).toEqual(Uint8Array.of(0, 1, 2));
		expect(seen).toMatchObject({ ended: true, overs: 1 });
	});

	it('breaks off and logs when its source throws', async () => {
		const logged = vi.spyOn(console, 'error').mockImplementation(() => {});
		const { seen, stream } = counter(1, new Error('the database has gone'));
		await expect(new Response(stream).arrayBuffer()).rejects.toThrow('the database has gone');
		expect(seen.overs).toBe(1);
		expect(logged.mock.calls.flat().join()).toContain('the database has gone');
	});
});
