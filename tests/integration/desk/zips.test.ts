import yazl from 'yazl';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { DraftFile } from '$lib/server/db/models/draft-file';
import type { Actor } from '$lib/server/domain/role';
import { getDraft } from '$lib/server/services/course-drafts/find-draft';
import { getDraftFile } from '$lib/server/services/course-drafts/get-draft-file';
import { startDraft } from '$lib/server/services/course-drafts/start-draft';
import { createCourseFromZip, exportZip, importZip } from '$lib/server/services/course-zips/course-zip';
import { filesOfZip } from '$lib/server/services/course-zips/read-zip';
import { zipOf } from '$lib/server/services/course-zips/write-zip';
import { createUser } from '../../factories/user';
import { createWrittenCourse } from '../../factories/written-course';

const now = new Date('2026-03-03T09:00:00Z');
let author: Actor;
let course: Awaited<ReturnType<typeof createWrittenCourse>>;

const begin = async () => {
	author = (await createUser('instructor')).actor;
	course = await createWrittenCourse();
	await startDraft(author, course.slug, now);
};

/** The course's own files under their zip's paths, and these in place of or beside them. */
const zipWith = (over: Record<string, string | undefined> = {}) => {
	const files = Object.entries({ ...course.files, ...over }).flatMap(
		([path, text]): [string, Uint8Array][] =>
			text === undefined ? [] : [[`${course.slug}/${path}`, Buffer.from(text)]]
	);
	return zipOf(new Map(files));
};
const rows = async () => {
	const draft = await getDraft(course.slug);
	return DraftFile.findAll({ where: { draftId: draft.id }, order: ['path'], raw: true });
};

describe('a zip of the content layout', () => {
	beforeEach(begin);

	it('a course goes out and comes in again byte for byte, and nothing has changed then', async () => {
		const before = await rows();
		const zip = await exportZip(author, course.slug);
		const files = await filesOfZip(zip);
		for (const [path, text] of Object.entries(course.files))
			expect(Buffer.from(files.get(`${course.slug}/${path}`)!).equals(Buffer.from(text))).toBe(true);
		await importZip(author, course.slug, zip, now);
		expect(await rows()).toEqual(before);
		expect((await exportZip(author, course.slug)).equals(zip)).toBe(true);
	});

	it('a zip takes the place of the draft’s files: what it changes has a history, what it leaves out is archived', async () => {
		const text = `${course.files['course.yaml'].replace(/ {4}exercises:[\s\S]*$/, '    exercises: []\n')}`;
		await importZip(
			author,
			course.slug,
			await zipWith({ 'course.yaml': text, [course.exercisePath]: undefined }),
			now
		);
		expect(await getDraftFile(author, course.slug, 'course.yaml')).toMatchObject({ text, revision: 2 });
		expect((await rows()).map(({ path }) => path)).toContain(`archive/${course.exercisePath}`);
	});

	it('a new course begins from a zip, unless there is one of its name', async () => {
		await expect(createCourseFromZip(author, await zipWith(), now)).rejects.toMatchObject({
			code: 'conflict'
		});
		const slug = `${course.slug}-again`;
		const files = Object.entries(course.files).map(([path, text]): [string, Uint8Array] => [
			`${slug}/${path}`,
			Buffer.from(text.replace(`slug: ${course.slug}\n`, `slug: ${slug}\n`))
		]);
		expect(await createCourseFromZip(author, await zipOf(new Map(files)), now)).toBe(slug);
		expect((await getDraftFile(author, slug, course.lessonPath)).text).toBe(course.files[course.lessonPath]);
	});
});

/** A zip with a byte string in it put in the place of another of its length, wherever it stands. */
function patched(zip: Buffer, from: string | Buffer, to: string | Buffer): Buffer {
	const copy = Buffer.from(zip);
	let found = 0;
	for (let at = copy.indexOf(from); at >= 0; at = copy.indexOf(from, at + 1)) {
		Buffer.from(to as string).copy(copy, at);
		found++;
	}
	expect(found).toBeGreaterThan(0);
	return copy;
}
const zipped = async (add: (zip: yazl.ZipFile) => void): Promise<Buffer> => {
	const zip = new yazl.ZipFile();
	for (const [path, text] of Object.entries(course.files))
		zip.addBuffer(Buffer.from(text), `${course.slug}/${path}`);
	add(zip);
	zip.end();
	const chunks: Buffer[] = [];
	for await (const chunk of zip.outputStream) chunks.push(chunk as Buffer);
	return Buffer.concat(chunks);
};
const lesson = () => `${course.slug}/${course.lessonPath}`;

const attacks: [string, () => Promise<Buffer>, RegExp][] = [
	['what is no zip', () => Promise.resolve(Buffer.from('PK, or so it says')), /no zip that can be read/],
	['an empty body', () => Promise.resolve(Buffer.alloc(0)), /no zip that can be read/],
	['a zip cut short', async () => (await zipWith()).subarray(0, 300), /no zip that can be read/],
	[
		'more files than are taken',
		() =>
			zipped((zip) =>
				Array.from({ length: 2001 }, (_, i) =>
					zip.addBuffer(Buffer.from('x'), `${course.slug}/03-x/f-${i}.md`, { compress: false })
				)
			),
		/has 2004 entries; at most 2000/
	],
	[
		'a bomb',
		() => zipped((zip) => zip.addBuffer(Buffer.alloc(3_900_000), `${course.slug}/03-x/bomb.md`)),
		/bomb\.md would unpack to more than 200 times/
	],
	[
		'a file that is too large',
		() =>
			zipped((zip) =>
				zip.addBuffer(Buffer.alloc(5_000_000), `${course.slug}/03-x/long.md`, { compress: false })
			),
		/long\.md is larger than 4 MB/
	],
	[
		'a zip that is too large',
		() => zipped((zip) => zip.addBuffer(Buffer.alloc(13_000_000), 'x', { compress: false })),
		/larger than 12 MB/
	],
	[
		'a path outside',
		async () =>
			patched(
				await zipped((zip) => zip.addBuffer(Buffer.from('x'), 'aa/evil.md')),
				'aa/evil.md',
				'../evil.md'.slice(0, 10)
			),
		/no zip that can be read: invalid relative path/
	],
	[
		'an absolute path',
		async () =>
			patched(await zipped((zip) => zip.addBuffer(Buffer.from('x'), 'a/evil.md')), 'a/evil.md', '/etc/l.md'),
		/no zip that can be read: absolute path/
	],
	[
		'a link',
		() =>
			zipped((zip) =>
				zip.addBuffer(Buffer.from('/etc/passwd'), `${course.slug}/03-x/link.md`, { mode: 0o120777 })
			),
		/link\.md is neither a file nor a folder/
	],
	[
		'a file twice',
		() => zipped((zip) => zip.addBuffer(Buffer.from('x'), lesson())),
		/lesson\.md is in the zip twice/
	],
	['a program', () => zipWith({ '03-x/run.exe': 'MZ' }), /run\.exe is no file of a course/],
	[
		'a second folder',
		() => zipped((zip) => zip.addBuffer(Buffer.from('x'), 'other/course.yaml')),
		/holds one folder/
	],
	['a lesson left out', () => zipWith({ [course.lessonPath]: undefined }), /lesson\.md:1: is missing/],
	[
		'a file that nothing names',
		() => zipWith({ [course.lessonPath.replace('lesson', 'notes')]: 'x' }),
		/is not named in course\.yaml/
	],
	['a course.yaml with a fault', () => zipWith({ 'course.yaml': 'slug: [' }), /course\.yaml:1/],
	[
		'a claim of a smaller size',
		async () => {
			const text = 'x'.repeat(4000);
			const zip = await zipped((one) => one.addBuffer(Buffer.from(text), `${course.slug}/03-x/liar.md`));
			const size = Buffer.alloc(4);
			size.writeUInt32LE(4000);
			const less = Buffer.alloc(4);
			less.writeUInt32LE(40);
			return patched(zip, size, less);
		},
		/no zip that can be read: too many bytes/
	]
];

describe('importZip(actor, slug, zip, now) refuses with the reason, and changes nothing', () => {
	beforeAll(begin);

	it.each(attacks)('%s', async (_, make, reason) => {
		const before = await rows();
		const taken = importZip(author, course.slug, await make(), now);
		await expect(taken).rejects.toMatchObject({ code: 'invalid' });
		await expect(taken).rejects.toThrow(reason);
		expect(await rows()).toEqual(before);
	});

	it('another course’s zip', async () => {
		const other = await createWrittenCourse();
		await startDraft(author, other.slug, now);
		const zip = await exportZip(author, other.slug);
		await expect(importZip(author, course.slug, zip, now)).rejects.toThrow(/holds the course/);
	});
});
