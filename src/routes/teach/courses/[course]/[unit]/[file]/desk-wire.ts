/** The desk's way to the server, for one file of one draft. */
import { SaveConflict, type DeskWire } from '$lib/components/desk/desk-wire';
import { fileVersions, fileVersionText, presenceView, saveConflict, savedFile } from '$lib/schemas/desk';
import { figureState } from '$lib/schemas/figure-view';
import { exercisePreview, lessonPreview } from '$lib/schemas/preview-view';
import { proofState } from '$lib/schemas/proof-view';

interface Asked {
	method?: string;
	body?: unknown;
}

/** @param course slug; @param path of the file */
export function deskWire(course: string, path: string): DeskWire {
	const query = `?path=${encodeURIComponent(path)}`;
	const ask = async (what: string, { method = 'GET', body }: Asked = {}): Promise<unknown> => {
		const response = await fetch(`/api/drafts/${course}/${what}`, {
			method,
			...(body !== undefined && {
				headers: { 'content-type': 'application/json' },
				body: JSON.stringify(body)
			})
		}).catch(() => {
			throw new Error('The server could not be reached. Check the connection.');
		});
		if (response.ok) return response.json();
		return refuse(response);
	};
	const post = (what: string, body: unknown) => ask(what, { method: 'POST', body });
	return {
		save: async (text, revision) =>
			savedFile.parse(await ask('files', { method: 'PUT', body: { path, text, revision } })),
		restore: async (versionId, revision) =>
			savedFile.parse(await post('restorations', { path, versionId, revision })),
		presence: async () => presenceView.parse(await post('presence', { path })),
		versions: async () => fileVersions.parse(await ask(`versions${query}`)).versions,
		version: async (id) => fileVersionText.parse(await ask(`versions/${id}${query}`)),
		previewLesson: async (text) => lessonPreview.parse(await post('previews/lesson', { text })),
		turnFigure: async (text, id, values) =>
			figureState.parse(await post('previews/figure', { text, id, values })),
		previewExercise: async (text, seed) =>
			exercisePreview.parse(await post('previews/exercise', { text, path, seed })),
		proof: async () => proofState.parse(await ask(`proofs${query}`)),
		askForProof: async () => proofState.parse(await post('proofs', { path })),
		cancelProof: async () => proofState.parse(await ask(`proofs${query}`, { method: 'DELETE' }))
	};
}

async function refuse(response: Response): Promise<never> {
	if (response.status === 401) throw new Error('You are no longer signed in. Sign in again in another tab.');
	const isJson = response.headers.get('content-type')?.includes('application/json');
	const body: unknown = isJson ? await response.json() : {};
	const conflict = saveConflict.safeParse(body);
	if (response.status === 409 && conflict.success)
		throw new SaveConflict(conflict.data.message, conflict.data.theirs);
	const { message, issues = [] } = body as {
		message?: string;
		issues?: { field: string; message: string }[];
	};
	const why = issues.map((issue) => `${issue.field} ${issue.message}`).join('; ');
	throw new Error([message ?? 'That did not work. Try again in a moment.', why].filter(Boolean).join(' '));
}
