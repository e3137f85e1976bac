import { request, type IncomingHttpHeaders } from 'node:http';

export interface RawResponse {
	status: number;
	headers: IncomingHttpHeaders;
	body: string;
}

const origin = process.env.E2E_ORIGIN ?? '';

/** Sends exactly these headers and this body: what a browser or a fetch would add or forbid stays out of the way. */
export function rawRequest(
	method: string,
	path: string,
	headers: Record<string, string> = {},
	body?: string
): Promise<RawResponse> {
	return new Promise((resolve, reject) => {
		const sent = request(new URL(path, origin), { method, headers, agent: false }, (response) => {
			const chunks: Buffer[] = [];
			response.on('data', (chunk: Buffer) => chunks.push(chunk));
			response.on('end', () =>
				resolve({
					status: response.statusCode ?? 0,
					headers: response.headers,
					body: Buffer.concat(chunks).toString()
				})
			);
		});
		sent.on('error', reject);
		sent.end(body);
	});
}
