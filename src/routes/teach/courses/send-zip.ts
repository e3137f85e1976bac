/** Sends a zip. @returns the course's slug; @throws Error whose message says why it was refused */
export async function sendZip(address: string, file: File): Promise<string> {
	const response = await fetch(address, {
		method: 'POST',
		headers: { 'content-type': 'application/zip' },
		body: file
	}).catch(() => {
		throw new Error('The server could not be reached. Check the connection.');
	});
	const isJson = response.headers.get('content-type')?.includes('application/json');
	const body = (isJson ? await response.json() : {}) as { course?: string; message?: string };
	if (!response.ok || body.course === undefined)
		throw new Error(body.message ?? 'The zip could not be taken in: it may be too large.');
	return body.course;
}
