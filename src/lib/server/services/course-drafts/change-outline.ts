import type { Transaction } from 'sequelize';
import type { OutlineChange } from '$lib/schemas/desk';
import { DraftFile } from '$lib/server/db/models/draft-file';
import { draftFileContents } from '$lib/server/db/queries/draft-files';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { getDraft, refuseReaders } from './find-draft';
import { applyOutlineChange } from './outline/apply-outline-change';
import { DraftOutline, type FileChanges } from './outline/draft-outline';
import { slugsElsewhere } from './taken-slugs';
import { changeDraftFile, createDraftFile, type Change } from './write-draft-file';

/**
 * Changes what a draft's course is made of: its course.yaml, and the files that go with it.
 * @throws DomainError `not_found`; `conflict` where the course has no room for it
 */
export function changeOutline(actor: Actor, slug: string, change: OutlineChange, now: Date): Promise<void> {
	refuseReaders(actor);
	return inTransaction(async (transaction) => {
		const draft = await getDraft(slug, transaction, true);
		const files = await draftFileContents(draft.id, transaction);
		const text = (path: string) => files.find((file) => file.path === path)?.bytes.toString('utf8') ?? '';
		const outline = new DraftOutline(text('course.yaml'));
		const elsewhere = await slugsElsewhere(draft.courseId, transaction);
		const changes = applyOutlineChange(
			{
				outline,
				paths: files.map(({ path }) => path),
				text,
				takenUnit: (name) => elsewhere.units.has(name) || outline.units.some((unit) => unit.slug === name),
				takenExercise: (name) =>
					elsewhere.exercises.has(name) || outline.units.some(({ exercises }) => exercises.includes(name))
			},
			change
		);
		await applyToFiles(draft.id, changes, { origin: 'outline', by: actor.id, now }, transaction);
	});
}

/** Moves files and writes them, in that order. */
export async function applyToFiles(
	draftId: number,
	{ moves, writes }: FileChanges,
	change: Omit<Change, 'bytes'>,
	transaction: Transaction
): Promise<void> {
	for (const { from, to } of moves)
		await DraftFile.update({ path: to }, { where: { draftId, path: from }, transaction });
	for (const { path, text } of writes) {
		const bytes = Buffer.from(text, 'utf8');
		const file = await DraftFile.findOne({
			where: { draftId, path },
			lock: transaction.LOCK.UPDATE,
			transaction
		});
		if (file) await changeDraftFile(file, { ...change, bytes }, transaction);
		else await createDraftFile(draftId, path, { ...change, bytes }, transaction);
	}
}
