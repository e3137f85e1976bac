import type { DraftView } from '$lib/schemas/desk';
import { readOutline } from '$lib/server/content/read-course';
import { folderOf } from '$lib/server/content/read-course';
import { EditionFile } from '$lib/server/db/models/edition-file';
import { draftFileContents, draftFileLines } from '$lib/server/db/queries/draft-files';
import type { Actor } from '$lib/server/domain/role';
import { newestEdition } from '../courses/lock-course';
import { changesAgainst } from './draft-changes';
import { draftTree } from './draft-tree';
import { ARCHIVE, getDraft, refuseReaders } from './find-draft';
import { exerciseStatesOf } from './proven-exercises';
import { titleOf } from './titles';

/** A draft with all that stands in it, and what an edition published now would change. @throws DomainError `not_found` */
export async function viewDraft(actor: Actor, slug: string): Promise<DraftView> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const [lines, contents, edition] = await Promise.all([
		draftFileLines(draft.id),
		draftFileContents(draft.id),
		newestEdition(draft.courseId)
	]);
	const lineOf = new Map(lines.map((line) => [line.path, line]));
	const fileOf = new Map(contents.map((file) => [file.path, file]));
	const live = contents.filter(({ path }) => !path.startsWith(ARCHIVE));
	const outline = readOutline(draftTree(slug, new Map(live.map(({ path, bytes }) => [path, bytes]))));
	const published = edition ? await EditionFile.findAll({ where: { editionId: edition.id } }) : [];
	const hashes = new Set(published.map(({ hash }) => hash));
	const changed = (path: string) => {
		const { changedBy, changedAt } = lineOf.get(path)!;
		return { path, changedBy, changedAt: changedAt.toISOString() };
	};
	const units = outline.units.map((unit) => ({
		unit,
		files: unit.exercises.map((exercise) => fileOf.get(`${folderOf(unit)}/${exercise}.yaml`)!)
	}));
	const states = await exerciseStatesOf(
		draft.courseId,
		units.flatMap(({ files }) => files),
		hashes
	);
	let next = 0;
	const view = units.map(({ unit: { number, slug: name, title, summary, exercises }, files }) => ({
		...{ number, slug: name, title, summary },
		lesson: {
			...changed(`${folderOf({ number, slug: name })}/lesson.md`),
			published: hashes.has(fileOf.get(`${folderOf({ number, slug: name })}/lesson.md`)!.hash)
		},
		exercises: files.map((file, i) => ({
			slug: exercises[i],
			title: titleOf(file.hash, file.bytes, exercises[i]),
			state: states[next++],
			...changed(file.path)
		}))
	}));
	return {
		...{ slug, title: outline.title, summary: outline.summary },
		newest: edition && { number: edition.number, publishedAt: edition.createdAt.toISOString() },
		units: view,
		archive: archiveOf(contents),
		changes: changesAgainst(published, live),
		unproven: view
			.flatMap(({ exercises }) => exercises)
			.filter(({ state }) => state !== 'published' && state !== 'proven')
			.map(({ path, title }) => ({ path, title }))
	};
}

function archiveOf(files: { path: string; hash: string; bytes: Buffer }[]): DraftView['archive'] {
	const archived = files.filter(({ path }) => path.startsWith(ARCHIVE));
	const entries = archived.filter(({ path }) => path.endsWith('/unit.yaml'));
	const folders = new Set(entries.map(({ path }) => path.split('/')[1]));
	const listed = new Set(
		entries.flatMap(({ path, bytes }) =>
			[...bytes.toString('utf8').matchAll(/^ {2}- (.+)$/gm)].map(
				([, slug]) => `archive/${path.split('/')[1]}/${slug}.yaml`
			)
		)
	);
	return {
		units: entries.map(({ path, hash, bytes }) => {
			const folder = path.split('/')[1];
			return { folder, title: titleOf(hash, bytes, folder) };
		}),
		exercises: archived
			.filter(({ path }) => /^archive\/\d\d-[^/]+\/[^/]+\.yaml$/.test(path) && !path.endsWith('/unit.yaml'))
			.filter(({ path }) => !(folders.has(path.split('/')[1]) && listed.has(path)))
			.map(({ path, hash, bytes }) => ({ path, title: titleOf(hash, bytes, path) }))
	};
}
