import { beforeEach, describe, expect, it } from 'vitest';
import { DraftFile } from '$lib/server/db/models/draft-file';
import { DraftFileVersion } from '$lib/server/db/models/draft-file-version';
import type { Actor } from '$lib/server/domain/role';
import { changeOutline } from '$lib/server/services/course-drafts/change-outline';
import { createCourse } from '$lib/server/services/course-drafts/create-course';
import { getDraft } from '$lib/server/services/course-drafts/find-draft';
import { getDraftFile } from '$lib/server/services/course-drafts/get-draft-file';
import { getFileVersion, listFileVersions } from '$lib/server/services/course-drafts/list-file-versions';
import { notePresence } from '$lib/server/services/course-drafts/note-presence';
import { restoreDraftFile, saveDraftFile } from '$lib/server/services/course-drafts/save-draft-file';
import { startDraft } from '$lib/server/services/course-drafts/start-draft';
import { createUser } from '../../factories/user';
import { createWrittenCourse } from '../../factories/written-course';

const at = (minutes: number) => new Date(Date.UTC(2026, 2, 3, 9, minutes));
let bridget: Actor;
let silas: Actor;
let course: Awaited<ReturnType<typeof createWrittenCourse>>;
let path: string;

beforeEach(async () => {
	bridget = (await createUser('instructor')).actor;
	silas = (await createUser('instructor')).actor;
	course = await createWrittenCourse();
	path = course.lessonPath;
	await startDraft(bridget, course.slug, at(0));
});

const save = (actor: Actor, text: string, revision: number, minutes: number) =>
	saveDraftFile(actor, course.slug, { path, text, revision }, at(minutes));
const versions = async () => (await listFileVersions(bridget, course.slug, path)).versions;

describe('startDraft(actor, slug, now)', () => {
	it('holds the newest edition’s files, byte for byte, and begins no second draft', async () => {
		await startDraft(silas, course.slug, at(5));
		for (const [name, text] of Object.entries(course.files)) {
			const file = await getDraftFile(silas, course.slug, name);
			expect(file).toMatchObject({ path: name, text, revision: 1, changedAt: at(0).toISOString() });
		}
		expect((await versions()).map(({ origin }) => origin)).toEqual(['begun']);
	});

	it('is for authors', async () => {
		const { actor } = await createUser('apprentice');
		expect(() => startDraft(actor, course.slug, at(0))).toThrow('written by instructors');
		await expect(getDraftFile(actor, course.slug, path)).rejects.toMatchObject({ code: 'forbidden' });
	});
});

describe('saveDraftFile(actor, slug, request, now)', () => {
	it('refuses a save over somebody else’s, says who and when, and hands theirs over', async () => {
		expect(await save(silas, 'His.', 1, 1)).toMatchObject({ revision: 2, changedAt: at(1).toISOString() });
		await expect(save(bridget, 'Hers.', 1, 2)).rejects.toMatchObject({
			code: 'conflict',
			details: { theirs: { text: 'His.', revision: 2, changedAt: at(1).toISOString() } }
		});
		expect((await getDraftFile(bridget, course.slug, path)).text).toBe('His.');
		expect(await save(bridget, 'His. And hers.', 2, 3)).toMatchObject({ revision: 3 });
	});

	it('lets only one of two win who save at the same moment', async () => {
		const both = await Promise.allSettled([save(bridget, 'Hers.', 1, 1), save(silas, 'His.', 1, 1)]);
		expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
	});

	it('makes one version of what one person types within five minutes, and another after that or of another person', async () => {
		await save(bridget, 'a', 1, 1);
		await save(bridget, 'ab', 2, 3);
		await save(bridget, 'abc', 3, 7);
		await save(silas, 'abcd', 4, 8);
		expect((await versions()).map(({ changedAt }) => changedAt)).toEqual(
			[8, 7, 3, 0].map((minutes) => at(minutes).toISOString())
		);
	});

	it('keeps nothing anew when nothing has changed', async () => {
		expect(await save(silas, course.files[path], 1, 1)).toMatchObject({ revision: 1 });
		expect(await versions()).toHaveLength(1);
	});

	it('leaves the file unchanged when it fails late', async () => {
		DraftFileVersion.addHook('beforeCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(save(bridget, 'Hers.', 1, 1)).rejects.toThrow('late');
		DraftFileVersion.removeHook('beforeCreate', 'fail late');
		expect(await getDraftFile(bridget, course.slug, path)).toMatchObject({
			revision: 1,
			text: course.files[path]
		});
	});
});

describe('restoreDraftFile(actor, slug, request, now)', () => {
	it('brings an earlier version back as a version of its own, and loses nothing', async () => {
		await save(silas, 'His.', 1, 1);
		const [, begun] = await versions();
		await restoreDraftFile(bridget, course.slug, { path, versionId: begun.id, revision: 2 }, at(2));
		expect((await getDraftFile(bridget, course.slug, path)).text).toBe(course.files[path]);
		const [restored, his] = await versions();
		expect(restored).toMatchObject({ origin: 'restored', note: 'the version of 2026-03-03, 09:00 UTC' });
		expect((await getFileVersion(bridget, course.slug, path, his.id)).text).toBe('His.');
	});

	it('knows no version of another file', async () => {
		const other = (await listFileVersions(bridget, course.slug, course.exercisePath)).versions[0];
		const request = { path, versionId: other.id, revision: 1 };
		await expect(restoreDraftFile(bridget, course.slug, request, at(2))).rejects.toMatchObject({
			code: 'not_found'
		});
	});
});

describe('notePresence(actor, slug, path, now)', () => {
	it('tells each who else has the file open, until their page has been silent for half a minute', async () => {
		expect((await notePresence(bridget, course.slug, path, at(1))).others).toEqual([]);
		const seen = await notePresence(silas, course.slug, path, at(1));
		expect(seen.others).toMatchObject([{ openedAt: at(1).toISOString() }]);
		expect((await notePresence(bridget, course.slug, path, at(1))).others).toHaveLength(1);
		expect((await notePresence(bridget, course.slug, path, at(2))).others).toEqual([]);
	});
});

describe('changeOutline(actor, slug, change, now)', () => {
	it('moves an exercise’s file with its history, and keeps what is archived', async () => {
		const { slug, unit, exercise, exercisePath } = course;
		await changeOutline(bridget, slug, { do: 'add-unit', title: 'Second', summary: 'Later.' }, at(1));
		await changeOutline(bridget, slug, { do: 'move-exercise', exercise, unit: 'second', to: 0 }, at(2));
		const moved = await getDraftFile(bridget, slug, `04-second/${exercise}.yaml`);
		expect(moved.text).toBe(course.files[exercisePath]);
		await changeOutline(silas, slug, { do: 'archive-exercise', exercise }, at(3));
		const back = { do: 'restore-exercise', path: `archive/04-second/${exercise}.yaml`, unit } as const;
		await changeOutline(silas, slug, back, at(4));
		expect((await listFileVersions(bridget, slug, exercisePath)).versions).toHaveLength(1);
		expect((await getDraftFile(bridget, slug, 'course.yaml')).text).toMatch(/^# The quay’s\.\n/);
	});

	it('changes the outline for two people one after the other', async () => {
		const { slug } = course;
		const add = (actor: Actor, title: string) =>
			changeOutline(actor, slug, { do: 'add-unit', title, summary: 'More.' }, at(1));
		await Promise.all([add(bridget, 'One'), add(silas, 'Two'), add(bridget, 'Three')]);
		const { text } = await getDraftFile(bridget, slug, 'course.yaml');
		expect([...text.matchAll(/number: (\d)/g)].map(([, number]) => number)).toEqual(['3', '4', '5', '6']);
	});

	it('leaves every file as it was when it fails late', async () => {
		const { slug, exercise } = course;
		const draft = await getDraft(slug);
		const before = await DraftFile.findAll({ where: { draftId: draft.id }, raw: true });
		DraftFileVersion.addHook('beforeCreate', 'fail late', () => {
			throw new Error('late');
		});
		await expect(changeOutline(bridget, slug, { do: 'archive-exercise', exercise }, at(1))).rejects.toThrow(
			'late'
		);
		DraftFileVersion.removeHook('beforeCreate', 'fail late');
		expect(await DraftFile.findAll({ where: { draftId: draft.id }, raw: true })).toEqual(before);
	});
});

it('createCourse(actor, asked, now) begins a course of one unit under an address of its own', async () => {
	const asked = { title: 'Quay', summary: 'New.', unit: 'First steps' };
	const one = await createCourse(bridget, asked, at(1));
	const two = await createCourse(silas, asked, at(1));
	expect(two).not.toBe(one);
	expect((await getDraftFile(silas, one, '01-first-steps/lesson.md')).text).toMatch(/^# First steps\n/);
});
