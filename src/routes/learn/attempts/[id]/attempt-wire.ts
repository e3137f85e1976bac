/** The bench's way to the server: one method an endpoint, refusals as Refusal, everything else as it failed. */
import { Refusal, type BenchWire } from '$lib/components/bench/state/bench-wire';
import {
	attemptResponse,
	draftsResponse,
	hintResponse,
	problemResponse,
	readingResponse,
	type AttemptView
} from '$lib/schemas/attempt';
import { FrameDecoder, type Frame } from '$lib/schemas/frames';
import { savedSetUpsResponse, saveSetUpResponse } from '$lib/schemas/saved-set-up';
import { setUpsResponse } from '$lib/schemas/set-up-log';

/** @param attemptId whose endpoints are meant */
export function attemptWire(attemptId: AttemptView['id']): BenchWire {
	const base = `/api/attempts/${attemptId}`;
	const send = (
		method: string,
		path: string,
		body: unknown,
		more: Pick<RequestInit, 'signal' | 'keepalive'> = {}
	) =>
		answered(
			fetch(base + path, {
				method,
				headers: { 'content-type': 'application/json' },
				body: JSON.stringify(body),
				...more
			})
		);
	return {
		sweeps: async (request, signal) => framesOf(await send('POST', '/sweeps', request, { signal })),
		rows: async (from, to) => framesOf(await answered(fetch(`${base}/rows?from=${from}&to=${to}`))),
		setUps: async () => setUpsResponse.parse(await (await answered(fetch(`${base}/set-ups`))).json()).setUps,
		savedSetUps,
		keep: async (request) => {
			await send('POST', '/logbook', request);
		},
		acknowledge: async (row) => {
			await send('POST', '/acknowledgements', { row });
		},
		takeReading: async (request) =>
			readingResponse.parse(await (await send('POST', '/readings', request)).json()).reading,
		saveDrafts: async (answers, leaving) => {
			const response = await send('PUT', '/drafts', { answers }, { keepalive: leaving });
			return draftsResponse.parse(await response.json()).savedAt;
		},
		saveMarkings: async (markings, leaving) => {
			await send('PUT', '/markings', { markings }, { keepalive: leaving });
		},
		nextHint: async () => hintResponse.parse(await (await send('POST', '/hints', {})).json()),
		handIn: async (answers) => {
			await send('POST', '/answers', { answers });
		},
		abandon: async () => {
			await send('POST', '/abandonment', {});
		},
		reload: async () => attemptResponse.parse(await (await answered(fetch(base))).json()).attempt
	};
}

/** The rows on show after one step of the taught method on a closed attempt's signal. */
export const doneRightRows = async (
	attemptId: AttemptView['id'],
	step: number
): Promise<AsyncIterable<Frame[]>> =>
	framesOf(await answered(fetch(`/api/attempts/${attemptId}/done-right/rows?step=${step}`)));

const savedSetUps: NonNullable<BenchWire['savedSetUps']> = {
	list: async () => savedSetUpsResponse.parse(await (await answered(fetch('/api/set-ups'))).json()).setUps,
	save: async (name, settings) => {
		const response = await answered(
			fetch('/api/set-ups', {
				method: 'POST',
				headers: { 'content-type': 'application/json' },
				body: JSON.stringify({ name, settings })
			})
		);
		return saveSetUpResponse.parse(await response.json()).replaced;
	},
	remove: async (id) => {
		await answered(fetch(`/api/set-ups/${id}`, { method: 'DELETE' }));
	}
};

/** The response when it is good. @throws Refusal with what the server said when it is not */
async function answered(asked: Promise<Response>): Promise<Response> {
	const response = await asked;
	if (response.ok) return response;
	const problem = problemResponse.safeParse(await response.json().catch(() => undefined));
	const message = problem.success ? problem.data.message : `The server answered ${response.status}.`;
	throw new Refusal(response.status, message, problem.success ? problem.data.issues : []);
}

/** The frames of a stream as they come, in the batches they come in. */
async function* framesOf(response: Response): AsyncGenerator<Frame[]> {
	if (!response.body) return;
	const decoder = new FrameDecoder();
	const reader = response.body.getReader();
	try {
		for (;;) {
			const { done, value } = await reader.read();
			if (done) return;
			const frames = decoder.push(value);
			if (frames.length > 0) yield frames;
		}
	} finally {
		await reader.cancel().catch(() => undefined);
	}
}
