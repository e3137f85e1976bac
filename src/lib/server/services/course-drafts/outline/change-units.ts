import { parse, stringify } from 'yaml';
import type { OutlineChange } from '$lib/schemas/desk';
import { courseUnit } from '$lib/schemas/course-file';
import { folderOf } from '$lib/server/content/read-course';
import { DomainError } from '$lib/server/errors';
import { fileOf, renamedExercise, type Before } from './change-exercises';
import type { FileChanges, UnitEntry } from './draft-outline';
import { lessonStart } from './exercise-start';
import { freeSlug, slugOf } from './slug-of';

const MOST_UNITS = 40;
/** Beside an archived unit's files: its entry of course.yaml, to be brought back. */
const ENTRY = 'unit.yaml';

type ChangeOf<D extends OutlineChange['do']> = Extract<OutlineChange, { do: D }>;

function nextNumber(before: Before): number {
	const { units } = before.outline;
	if (units.length >= MOST_UNITS)
		throw new DomainError('conflict', `A course has at most ${MOST_UNITS} units.`);
	return Math.max(0, ...units.map(({ number }) => number)) + 1;
}

export function addUnit(before: Before, { title, summary }: ChangeOf<'add-unit'>): FileChanges {
	const number = nextNumber(before);
	const slug = freeSlug(slugOf(title), before.takenUnit);
	before.outline.addUnit({ number, slug, title, summary, exercises: [] });
	return {
		moves: [],
		writes: [{ path: `${folderOf({ number, slug })}/lesson.md`, text: lessonStart(title) }]
	};
}

export function renameUnit(before: Before, { unit, title, summary }: ChangeOf<'rename-unit'>): FileChanges {
	const { node } = before.outline.unit(unit);
	node.set('title', title);
	node.set('summary', summary);
	return { moves: [], writes: [] };
}

/** The units keep the numbers that are given among them, in their order; folders follow the numbers. */
export function moveUnit(before: Before, { unit: slug, to }: ChangeOf<'move-unit'>): FileChanges {
	const { outline } = before;
	const old = outline.units;
	const numbers = old.map(({ number }) => number).sort((a, b) => a - b);
	const moved = outline.unit(slug);
	outline.removeUnit(moved);
	outline.addUnit(moved.node, Math.min(to, old.length - 1));
	const moves = outline.units.flatMap((unit, i) => {
		if (unit.number === numbers[i]) return [];
		unit.node.set('number', numbers[i]);
		return movesOf(before, folderOf(unit), folderOf({ ...unit, number: numbers[i] }));
	});
	return { moves, writes: [] };
}

/** Every file of a folder into another one. */
const movesOf = ({ paths }: Before, from: string, to: string): FileChanges['moves'] =>
	paths
		.filter((path) => path.startsWith(`${from}/`))
		.map((path) => ({ from: path, to: to + path.slice(from.length) }));

export function duplicateUnit(before: Before, { unit: slug }: ChangeOf<'duplicate-unit'>): FileChanges {
	const unit = before.outline.unit(slug);
	const number = nextNumber(before);
	const copy = { number, slug: freeSlug(`${slug}-copy`, before.takenUnit) };
	const folder = folderOf(copy);
	const writes = [{ path: `${folder}/lesson.md`, text: before.text(`${folderOf(unit)}/lesson.md`) }];
	const exercises = unit.exercises.map((exercise) => {
		const name = freeSlug(`${exercise}-copy`, before.takenExercise);
		const text = renamedExercise(before.text(fileOf(unit, exercise)), name);
		writes.push({ path: `${folder}/${name}.yaml`, text });
		return name;
	});
	const summary = String(unit.node.get('summary'));
	before.outline.addUnit({ ...copy, title: `${unit.title} (copy)`.slice(0, 300), summary, exercises });
	return { moves: [], writes };
}

export function archiveUnit(before: Before, { unit: slug }: ChangeOf<'archive-unit'>): FileChanges {
	const unit = before.outline.unit(slug);
	if (before.outline.units.length === 1)
		throw new DomainError('conflict', 'A course has at least one unit. Add another one first.');
	before.outline.removeUnit(unit);
	const folder = archivedFolder(before, unit);
	return {
		moves: movesOf(before, folderOf(unit), folder),
		writes: [{ path: `${folder}/${ENTRY}`, text: stringify(unit.node.toJSON()) }]
	};
}

function archivedFolder({ paths }: Before, unit: UnitEntry): string {
	const folder = `archive/${folderOf(unit)}`;
	let candidate = folder;
	for (let n = 2; paths.includes(`${candidate}/lesson.md`); n++) candidate = `${folder}~${n}`;
	return candidate;
}

export function restoreUnit(before: Before, { folder: name }: ChangeOf<'restore-unit'>): FileChanges {
	const folder = `archive/${name}`;
	if (name.includes('/') || !before.paths.includes(`${folder}/${ENTRY}`))
		throw new DomainError('not_found', 'No such unit is archived.');
	const entry = courseUnit.parse(parse(before.text(`${folder}/${ENTRY}`)));
	const number = nextNumber(before);
	const slug = freeSlug(entry.slug, before.takenUnit);
	const into = folderOf({ number, slug });
	const changes: FileChanges = { moves: [], writes: [] };
	changes.moves.push({ from: `${folder}/lesson.md`, to: `${into}/lesson.md` });
	const exercises = entry.exercises.map((exercise) => {
		const free = freeSlug(exercise, before.takenExercise);
		const from = `${folder}/${exercise}.yaml`;
		const to = `${into}/${free}.yaml`;
		changes.moves.push({ from, to });
		if (free !== exercise) changes.writes.push({ path: to, text: renamedExercise(before.text(from), free) });
		return free;
	});
	before.outline.addUnit({ ...entry, number, slug, exercises });
	return changes;
}
