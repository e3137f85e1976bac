import { folderOf } from '$lib/server/content/read-course';
import { parseDocument } from 'yaml';
import { DomainError } from '$lib/server/errors';
import type { OutlineChange } from '$lib/schemas/desk';
import type { DraftOutline, FileChanges, UnitEntry } from './draft-outline';
import { exerciseStart } from './exercise-start';
import { freeSlug, slugOf } from './slug-of';

/** A unit may hold so many exercises. */
const MOST_EXERCISES = 20;

/** What changes are made on: the outline, and the draft's files. */
export interface Before {
	outline: DraftOutline;
	/** Of every file, archived ones among them. */
	paths: readonly string[];
	text(path: string): string;
	/** Whether a slug is in use, in this draft or in another course. */
	takenExercise(slug: string): boolean;
	takenUnit(slug: string): boolean;
}

type ChangeOf<D extends OutlineChange['do']> = Extract<OutlineChange, { do: D }>;

export const fileOf = (unit: UnitEntry, exercise: string): string => `${folderOf(unit)}/${exercise}.yaml`;

function refuseOverfull({ exercises }: UnitEntry): void {
	if (exercises.length >= MOST_EXERCISES)
		throw new DomainError('conflict', `A unit holds at most ${MOST_EXERCISES} exercises.`);
}

export function addExercise(before: Before, { unit: slug, title }: ChangeOf<'add-exercise'>): FileChanges {
	const unit = before.outline.unit(slug);
	refuseOverfull(unit);
	const exercise = freeSlug(slugOf(title), before.takenExercise);
	before.outline.addExercise(unit, exercise, unit.exercises.length);
	return { moves: [], writes: [{ path: fileOf(unit, exercise), text: exerciseStart(exercise, title) }] };
}

export function duplicateExercise(before: Before, { exercise }: ChangeOf<'duplicate-exercise'>): FileChanges {
	const unit = before.outline.unitOf(exercise);
	refuseOverfull(unit);
	const copy = freeSlug(`${exercise}-copy`, before.takenExercise);
	before.outline.addExercise(unit, copy, unit.exercises.indexOf(exercise) + 1);
	const text = renamedExercise(before.text(fileOf(unit, exercise)), copy);
	return { moves: [], writes: [{ path: fileOf(unit, copy), text }] };
}

/** An exercise's text under another name. What is no YAML stays as it is: the author is told of it anyway. */
export function renamedExercise(text: string, slug: string): string {
	const document = parseDocument(text);
	if (document.errors.length > 0) return text;
	return text.replace(/^slug:.*$/m, `slug: ${slug}`);
}

export function moveExercise(
	before: Before,
	{ exercise, unit: slug, to }: ChangeOf<'move-exercise'>
): FileChanges {
	const from = before.outline.unitOf(exercise);
	const into = before.outline.unit(slug);
	if (into.slug !== from.slug) refuseOverfull(into);
	before.outline.removeExercise(from, exercise);
	const room = before.outline.unit(slug).exercises.length;
	before.outline.addExercise(into, exercise, Math.min(to, room));
	if (into.slug === from.slug) return { moves: [], writes: [] };
	return { moves: [{ from: fileOf(from, exercise), to: fileOf(into, exercise) }], writes: [] };
}

export function archiveExercise(before: Before, { exercise }: ChangeOf<'archive-exercise'>): FileChanges {
	const unit = before.outline.unitOf(exercise);
	before.outline.removeExercise(unit, exercise);
	const from = fileOf(unit, exercise);
	return { moves: [{ from, to: archivedPath(before, from) }], writes: [] };
}

/** Where a file goes that is taken out; beside one of the same name that was taken out before. */
export function archivedPath({ paths }: Pick<Before, 'paths'>, path: string): string {
	const [, stem, ending] = /^(.*?)(\.[a-z]+)$/.exec(path) ?? [path, path, ''];
	let candidate = `archive/${path}`;
	for (let n = 2; paths.includes(candidate); n++) candidate = `archive/${stem}~${n}${ending}`;
	return candidate;
}

export function restoreExercise(
	before: Before,
	{ path, unit: slug }: ChangeOf<'restore-exercise'>
): FileChanges {
	const named = /^archive\/[^/]+\/([a-z0-9-]+?)(~\d+)?\.yaml$/.exec(path);
	if (!named || !before.paths.includes(path) || named[1] === 'unit')
		throw new DomainError('not_found', 'No such exercise is archived.');
	const unit = before.outline.unit(slug);
	refuseOverfull(unit);
	const exercise = freeSlug(named[1], before.takenExercise);
	before.outline.addExercise(unit, exercise, unit.exercises.length);
	const to = fileOf(unit, exercise);
	const renamed =
		exercise === named[1] ? [] : [{ path: to, text: renamedExercise(before.text(path), exercise) }];
	return { moves: [{ from: path, to }], writes: renamed };
}
