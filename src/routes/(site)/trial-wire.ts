/** The front page's way to its bench on the server. */
import type { TrialWire } from '$lib/components/site/trial/trial.svelte';
import { problemResponse } from '$lib/schemas/attempt';
import { trialFinding, trialSweep, trialView } from '$lib/schemas/trial';

export const trialWire: TrialWire = {
	start: async () => trialView.parse(await post('/api/trial', {})),
	sweep: async (token, choice, row) =>
		trialSweep.parse(await post('/api/trial/rows', { token, choice, row })),
	answer: async (request) => trialFinding.parse(await post('/api/trial/answers', request))
};

/** @throws Error in the server's own words when it says no */
async function post(path: string, body: unknown): Promise<unknown> {
	const headers = { 'content-type': 'application/json' };
	const response = await fetch(path, { method: 'POST', headers, body: JSON.stringify(body) });
	if (response.ok) return response.json();
	const problem = problemResponse.safeParse(await response.json().catch(() => undefined));
	if (!problem.success) throw new Error(`The server answered ${response.status}. Try again in a moment.`);
	throw new Error(problem.data.issues?.[0]?.message ?? problem.data.message);
}
