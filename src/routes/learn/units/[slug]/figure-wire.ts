/** The lesson's way to the server: its figures at other choices. */
import type { AskFigure } from '$lib/components/figure/figure-run.svelte';
import { figureState, type FigureRequest, type FigureView } from '$lib/schemas/figure-view';

/** @param unitId whose figures are meant; @throws Error whose message is fit to be shown */
export const figureWire =
	(unitId: number, figures: readonly FigureView[]): AskFigure =>
	async (figureId, values) => {
		const controls = figures.find(({ id }) => id === figureId)?.controls ?? [];
		const request: FigureRequest = {
			values: Object.fromEntries(controls.map(({ setting }, i) => [setting, values[i]]))
		};
		const response = await fetch(`/api/figures/${unitId}/${figureId}`, {
			method: 'POST',
			headers: { 'content-type': 'application/json' },
			body: JSON.stringify(request)
		}).catch(() => {
			throw new Error('The figure could not be reached. Check the connection and try again.');
		});
		if (!response.ok) throw new Error(await messageOf(response));
		return figureState.parse(await response.json());
	};

async function messageOf(response: Response): Promise<string> {
	if (response.status === 401) return 'You are no longer signed in. Sign in again to go on.';
	const isJson = response.headers.get('content-type')?.includes('application/json');
	const { message } = isJson ? ((await response.json()) as { message?: string }) : {};
	return message ?? 'The figure could not be made. Try again in a moment.';
}
