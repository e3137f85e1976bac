import { describe, expect, it } from 'vitest';
import { applyOutlineChange } from '$lib/server/services/course-drafts/outline/apply-outline-change';
import { DraftOutline } from '$lib/server/services/course-drafts/outline/draft-outline';
import { exerciseStart } from '$lib/server/services/course-drafts/outline/exercise-start';
import { slugOf } from '$lib/server/services/course-drafts/outline/slug-of';
import { parseExerciseText } from '$lib/server/bench/exercise/parse-exercise';
import { proveExercise } from '$lib/server/bench/proof/prove-exercise';
import type { OutlineChange } from '$lib/schemas/desk';

const COURSE = `slug: harbour
# What the harbour asked for.
title: Harbour
summary: From the quay.
units:
  - number: 2
    slug: tune
    title: Tune # the first day
    summary: Peaks.
    exercises:
      - pilot
      - lamp
  - number: 6
    slug: spread
    title: Spread
    summary: Wide.
    exercises: []
`;
const FILES: Record<string, string> = {
	'course.yaml': COURSE,
	'02-tune/lesson.md': '# Tune\n',
	'02-tune/pilot.yaml': 'slug: pilot\ntitle: Pilot\n',
	'02-tune/lamp.yaml': 'slug: lamp\ntitle: Lamp\n',
	'06-spread/lesson.md': '# Spread\n'
};

/** The files after some changes, one after the other. */
function after(...changes: OutlineChange[]): Record<string, string> {
	const files = { ...FILES };
	for (const change of changes) {
		const outline = new DraftOutline(files['course.yaml']);
		const done = applyOutlineChange(
			{
				outline,
				paths: Object.keys(files),
				text: (path) => files[path],
				takenUnit: (slug) => outline.units.some((unit) => unit.slug === slug),
				takenExercise: (slug) =>
					slug === 'held-elsewhere' || outline.units.some((u) => u.exercises.includes(slug))
			},
			change
		);
		for (const { from, to } of done.moves) {
			expect(files[from]).toBeDefined();
			expect(files[to]).toBeUndefined();
			files[to] = files[from];
			delete files[from];
		}
		for (const { path, text } of done.writes) files[path] = text;
	}
	return files;
}
const outlineOf = (files: Record<string, string>) =>
	new DraftOutline(files['course.yaml']).units.map(({ number, slug, exercises }) => [
		number,
		slug,
		exercises
	]);

describe('applyOutlineChange(before, change)', () => {
	it('keeps comments and every line that it doesn’t change', () => {
		const text = after({ do: 'rename-unit', unit: 'spread', title: 'Spread signals', summary: 'Wider.' });
		expect(text['course.yaml']).toBe(
			COURSE.replace('title: Spread', 'title: Spread signals').replace('Wide.', 'Wider.')
		);
	});

	it('adds an exercise with a file that is ready to be changed', () => {
		const files = after({ do: 'add-exercise', unit: 'spread', title: 'Two & a half carriers' });
		expect(outlineOf(files)[1]).toEqual([6, 'spread', ['two-a-half-carriers']]);
		expect(files['06-spread/two-a-half-carriers.yaml']).toContain('slug: two-a-half-carriers\n');
	});

	it('gives no slug that is in use, here or in another course', () => {
		const files = after(
			{ do: 'add-exercise', unit: 'spread', title: 'Pilot' },
			{ do: 'add-exercise', unit: 'spread', title: 'Held elsewhere' }
		);
		expect(outlineOf(files)[1]).toEqual([6, 'spread', ['pilot-2', 'held-elsewhere-2']]);
	});

	it('orders exercises within a unit and moves them to another one with their file', () => {
		expect(outlineOf(after({ do: 'move-exercise', exercise: 'lamp', unit: 'tune', to: 0 }))[0]).toEqual([
			2,
			'tune',
			['lamp', 'pilot']
		]);
		const files = after({ do: 'move-exercise', exercise: 'lamp', unit: 'spread', to: 9 });
		expect(outlineOf(files)).toEqual([
			[2, 'tune', ['pilot']],
			[6, 'spread', ['lamp']]
		]);
		expect(files['06-spread/lamp.yaml']).toBe(FILES['02-tune/lamp.yaml']);
	});

	it('orders units, which keep the numbers that are given, and moves their folders', () => {
		const files = after({ do: 'move-unit', unit: 'spread', to: 0 });
		expect(outlineOf(files)).toEqual([
			[2, 'spread', []],
			[6, 'tune', ['pilot', 'lamp']]
		]);
		expect(Object.keys(files).sort()).toEqual(
			[
				'02-spread/lesson.md',
				'06-tune/lamp.yaml',
				'06-tune/lesson.md',
				'06-tune/pilot.yaml',
				'course.yaml'
			].sort()
		);
	});

	it('puts a unit back as it was when it is archived and restored, as the last one', () => {
		const files = after({ do: 'archive-unit', unit: 'tune' }, { do: 'restore-unit', folder: '02-tune' });
		expect(outlineOf(files)).toEqual([
			[6, 'spread', []],
			[7, 'tune', ['pilot', 'lamp']]
		]);
		expect(files['07-tune/pilot.yaml']).toBe(FILES['02-tune/pilot.yaml']);
	});

	it('keeps two archived exercises of one name apart, and restores either', () => {
		const files = after(
			{ do: 'archive-exercise', exercise: 'pilot' },
			{ do: 'add-exercise', unit: 'tune', title: 'Pilot' },
			{ do: 'archive-exercise', exercise: 'pilot' },
			{ do: 'restore-exercise', path: 'archive/02-tune/pilot.yaml', unit: 'spread' },
			{ do: 'restore-exercise', path: 'archive/02-tune/pilot~2.yaml', unit: 'spread' }
		);
		expect(outlineOf(files)).toEqual([
			[2, 'tune', ['lamp']],
			[6, 'spread', ['pilot', 'pilot-2']]
		]);
		expect(files['06-spread/pilot.yaml']).toBe(FILES['02-tune/pilot.yaml']);
		expect(files['06-spread/pilot-2.yaml']).toContain('slug: pilot-2\n');
	});

	it('duplicates a unit with its exercises under names of their own', () => {
		const files = after({ do: 'duplicate-unit', unit: 'tune' });
		expect(outlineOf(files)[2]).toEqual([7, 'tune-copy', ['pilot-copy', 'lamp-copy']]);
		expect(files['07-tune-copy/pilot-copy.yaml']).toBe('slug: pilot-copy\ntitle: Pilot\n');
	});

	it('refuses what isn’t there, and to take the last unit out', () => {
		expect(() => after({ do: 'archive-unit', unit: 'none' })).toThrow('no such unit');
		expect(() => after({ do: 'restore-unit', folder: '../course.yaml' })).toThrow('No such unit');
		expect(() => after({ do: 'archive-unit', unit: 'tune' }, { do: 'archive-unit', unit: 'spread' })).toThrow(
			'at least one unit'
		);
	});
});

it('slugOf(title) keeps letters and figures of any title', () => {
	expect(slugOf('Übergänge, 2 × “neu”')).toBe('ubergange-2-neu');
	expect(slugOf('…')).toBe('untitled');
});

it('a new exercise can be proven as it stands', () => {
	const exercise = parseExerciseText(exerciseStart('new-one', 'A: new “one”'), 'new-one.yaml');
	expect(exercise.title).toBe('A: new “one”');
	expect(proveExercise(exercise, { seeds: 20, fromSeed: 1 }).failures).toEqual([]);
});
