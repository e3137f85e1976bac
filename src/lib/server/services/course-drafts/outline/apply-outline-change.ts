import type { OutlineChange } from '$lib/schemas/desk';
import {
	addExercise,
	archiveExercise,
	duplicateExercise,
	moveExercise,
	restoreExercise,
	type Before
} from './change-exercises';
import { addUnit, archiveUnit, duplicateUnit, moveUnit, renameUnit, restoreUnit } from './change-units';
import type { FileChanges } from './draft-outline';

/**
 * What a change of the outline does to the draft's files, course.yaml among them.
 * @throws DomainError `not_found`; `conflict` where the course has no room for it
 */
export function applyOutlineChange(before: Before, change: OutlineChange): FileChanges {
	const { moves, writes } = changesOf(before, change);
	return { moves, writes: [...writes, { path: 'course.yaml', text: before.outline.toString() }] };
}

function changesOf(before: Before, change: OutlineChange): FileChanges {
	switch (change.do) {
		case 'rename-course':
			before.outline.setTitle(change.title, change.summary);
			return { moves: [], writes: [] };
		case 'add-unit':
			return addUnit(before, change);
		case 'rename-unit':
			return renameUnit(before, change);
		case 'move-unit':
			return moveUnit(before, change);
		case 'duplicate-unit':
			return duplicateUnit(before, change);
		case 'archive-unit':
			return archiveUnit(before, change);
		case 'restore-unit':
			return restoreUnit(before, change);
		case 'add-exercise':
			return addExercise(before, change);
		case 'move-exercise':
			return moveExercise(before, change);
		case 'duplicate-exercise':
			return duplicateExercise(before, change);
		case 'archive-exercise':
			return archiveExercise(before, change);
		case 'restore-exercise':
			return restoreExercise(before, change);
	}
}
