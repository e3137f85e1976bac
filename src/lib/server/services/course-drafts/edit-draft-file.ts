import type { FileDesk } from '$lib/schemas/desk';
import { folderOf } from '$lib/server/content/read-course';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { getProofState } from '../proofs/ask-for-proof';
import { getDraft, getDraftFileRow, refuseReaders } from './find-draft';
import { textOf, viewOfFile } from './get-draft-file';
import { DraftOutline } from './outline/draft-outline';
import { previewExerciseText, previewLesson } from './preview-file';

const FIRST_SEED = 1;

/** A lesson or an exercise of a draft with all that its desk shows at first. @throws DomainError `not_found` */
export async function editDraftFile(actor: Actor, slug: string, path: string): Promise<FileDesk> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const row = await getDraftFileRow(draft.id, path);
	const outline = new DraftOutline(await textOf((await getDraftFileRow(draft.id, 'course.yaml')).hash));
	const unit = outline.units.find((one) => folderOf(one) === path.split('/')[0]);
	if (!unit) throw new DomainError('not_found', 'The draft has no such file.');
	const file = await viewOfFile(row);
	const place = {
		course: { slug, title: outline.title },
		unit: { number: unit.number, title: unit.title },
		file
	};
	if (path.endsWith('.md')) {
		return { kind: 'lesson', ...place, preview: await previewLesson(actor, slug, file.text) };
	}
	const number = unit.exercises.indexOf(path.replace(/^.*\//, '').replace(/\.yaml$/, '')) + 1;
	const preview = await previewExerciseText(actor, slug, { text: file.text, path, seed: FIRST_SEED });
	return { kind: 'exercise', ...place, number, preview, proof: await getProofState(actor, slug, path) };
}
