import type { Transaction } from 'sequelize';
import { ContentError } from '$lib/server/content/content-error';
import { treeOfFiles } from '$lib/server/content/content-tree';
import { readStructure } from '$lib/server/content/read-course';
import { Course } from '$lib/server/db/models/course';
import { CourseDraft } from '$lib/server/db/models/course-draft';
import { DraftFile } from '$lib/server/db/models/draft-file';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError } from '$lib/server/errors';
import { draftFilesOf } from '../course-drafts/draft-tree';
import { ARCHIVE, getDraft, refuseReaders } from '../course-drafts/find-draft';
import { archivedPath } from '../course-drafts/outline/change-exercises';
import { changeDraftFile, createDraftFile, type Change } from '../course-drafts/write-draft-file';
import { filesOfZip } from './read-zip';
import { zipOf } from './write-zip';

/** A draft's course as a zip of the layout of content/. @throws DomainError `not_found` */
export async function exportZip(actor: Actor, slug: string): Promise<Buffer> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const files = await draftFilesOf(draft.id);
	return zipOf(new Map([...files].map(([path, bytes]) => [`${slug}/${path}`, bytes])));
}

/**
 * Puts a zip in the place of a draft's files. Those that it doesn't have go to the archive, and every file keeps its history.
 * @throws DomainError `not_found`; `invalid` with the reason, and nothing is changed
 */
export async function importZip(actor: Actor, slug: string, zip: Buffer, now: Date): Promise<void> {
	refuseReaders(actor);
	await getDraft(slug);
	const files = await courseOfZip(zip, slug);
	await inTransaction(async (transaction) => {
		const draft = await getDraft(slug, transaction, true);
		await replaceFiles(draft.id, files, { origin: 'zip', by: actor.id, now }, transaction);
	});
}

/**
 * A new course from a zip, as a draft.
 * @returns its slug
 * @throws DomainError `invalid` with the reason; `conflict` when there is such a course
 */
export async function createCourseFromZip(actor: Actor, zip: Buffer, now: Date): Promise<string> {
	refuseReaders(actor);
	const { slug, files } = await anyCourseOfZip(zip);
	return inTransaction(async (transaction) => {
		if (await Course.findOne({ where: { slug }, transaction })) {
			const message = `There is a course ${slug} already. Open its draft and bring the zip in there.`;
			throw new DomainError('conflict', message);
		}
		const course = await Course.create({ slug, createdAt: now }, { transaction });
		const draft = await CourseDraft.create(
			{ courseId: course.id, editionId: null, createdBy: actor.id, createdAt: now },
			{ transaction }
		);
		await replaceFiles(draft.id, files, { origin: 'zip', by: actor.id, now }, transaction);
		return slug;
	});
}

const refused = (message: string): DomainError => new DomainError('invalid', message, { issues: [] });

async function anyCourseOfZip(zip: Buffer): Promise<{ slug: string; files: Map<string, Uint8Array> }> {
	const all = await filesOfZip(zip);
	const folders = new Set([...all.keys()].map((path) => path.split('/')[0]));
	const [slug] = folders;
	if (folders.size !== 1 || !/^[a-z0-9]+(-[a-z0-9]+)*$/.test(slug))
		throw refused('A zip of a course holds one folder, which has the course’s name.');
	const files = new Map<string, Uint8Array>();
	for (const [path, bytes] of all) {
		const inside = path.slice(slug.length + 1);
		if (!/^(course\.yaml|\d\d-[a-z0-9-]+\/[a-z0-9-]+\.(md|yaml))$/.test(inside))
			throw refused(
				`${path} is no file of a course: those are course.yaml, and .md and .yaml in a unit’s folder.`
			);
		files.set(inside, bytes);
	}
	refuseBroken(slug, files);
	return { slug, files };
}

async function courseOfZip(zip: Buffer, wanted: string): Promise<Map<string, Uint8Array>> {
	const { slug, files } = await anyCourseOfZip(zip);
	if (slug !== wanted) throw refused(`The zip holds the course ${slug}; this is ${wanted}.`);
	return files;
}

function refuseBroken(slug: string, files: Map<string, Uint8Array>): void {
	try {
		readStructure(treeOfFiles(slug, files));
	} catch (cause) {
		if (cause instanceof ContentError) throw refused(`${cause.message}.`);
		throw cause;
	}
}

async function replaceFiles(
	draftId: number,
	files: ReadonlyMap<string, Uint8Array>,
	change: Omit<Change, 'bytes'>,
	transaction: Transaction
): Promise<void> {
	const rows = await DraftFile.findAll({
		where: { draftId },
		lock: transaction.LOCK.UPDATE,
		transaction
	});
	const paths = rows.map(({ path }) => path);
	for (const row of rows) {
		if (row.path.startsWith(ARCHIVE) || files.has(row.path)) continue;
		const path = archivedPath({ paths }, row.path);
		paths.push(path);
		await row.update({ path }, { transaction });
	}
	for (const [path, bytes] of files) {
		const row = rows.find((one) => one.path === path);
		if (row) await changeDraftFile(row, { ...change, bytes }, transaction);
		else await createDraftFile(draftId, path, { ...change, bytes }, transaction);
	}
}
