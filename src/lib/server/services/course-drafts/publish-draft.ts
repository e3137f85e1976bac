import { QueryTypes, type Transaction } from 'sequelize';
import type { CourseContent } from '$lib/server/content/course-content';
import { sequelize } from '$lib/server/db/connection';
import type { CourseDraft } from '$lib/server/db/models/course-draft';
import { draftFileContents } from '$lib/server/db/queries/draft-files';
import { inTransaction } from '$lib/server/db/transaction';
import type { Actor } from '$lib/server/domain/role';
import { DomainError, type Issue } from '$lib/server/errors';
import { checkedExercises, noteExercises } from '../courses/checked-content';
import { createEdition, hashOfContent } from '../courses/create-edition';
import { lockedCourse, newestEdition } from '../courses/lock-course';
import { askBench } from '../desk-threads/desk-threads';
import { linksIn } from './check-links';
import { draftTree } from './draft-tree';
import { ARCHIVE, getDraft, refuseReaders } from './find-draft';
import { exerciseStatesOf } from './proven-exercises';
import { slugsElsewhere } from './taken-slugs';

type Contents = Awaited<ReturnType<typeof draftFileContents>>;

/**
 * Publishes a draft as the course's next edition: from now on new attempts are made at it, and open ones keep theirs.
 * @returns the edition's number
 * @throws DomainError `not_found`; `invalid` with every fault, link that leads nowhere and exercise not proven;
 *   `conflict` when nothing has changed, or somebody has changed the draft meanwhile
 */
export async function publishDraft(actor: Actor, slug: string, now: Date): Promise<number> {
	refuseReaders(actor);
	const draft = await getDraft(slug);
	const contents = await liveContents(draft.id);
	const files = new Map(contents.map(({ path, bytes }) => [path, new Uint8Array(bytes)]));
	const known = await checkedExercises();
	const { content, faults, checked } = await askBench('course', { name: slug, files, checked: known });
	const issues = faults.map(({ file, line, field, reason }) => ({
		field: file.slice(slug.length + 1),
		message: `line ${line}: ${field ? `${field} ` : ''}${reason}`
	}));
	if (!content || issues.length > 0)
		throw new DomainError('invalid', 'The draft has faults and can’t be published.', { issues });
	const unready = [
		...(await issuesOfNames(draft, content)),
		...issuesOfLinks(content, await destinations(content)),
		...(await issuesOfProofs(draft, contents))
	];
	if (unready.length > 0)
		throw new DomainError('invalid', 'The draft can’t be published yet.', { issues: unready });
	return inTransaction(async (transaction) => {
		const course = await lockedCourse(slug, now, transaction);
		const locked = await getDraft(slug, transaction, true);
		await refuseChanged(locked, contents, transaction);
		const newest = await newestEdition(course.id, transaction);
		if (newest?.contentHash === hashOfContent(content))
			throw new DomainError('conflict', `Nothing has changed since edition ${newest.number}.`);
		const number = (newest?.number ?? 0) + 1;
		const tree = draftTree(slug, files);
		const edition = await createEdition(
			{ courseId: course.id, number, content, tree, publishedBy: actor.id, now },
			transaction
		);
		await noteExercises(checked, now, transaction);
		await locked.update({ editionId: edition.id }, { transaction });
		return number;
	});
}

const liveContents = async (draftId: number, transaction?: Transaction): Promise<Contents> =>
	(await draftFileContents(draftId, transaction)).filter(({ path }) => !path.startsWith(ARCHIVE));

async function refuseChanged({ id }: CourseDraft, checked: Contents, transaction: Transaction) {
	const now = await liveContents(id, transaction);
	const same =
		now.length === checked.length &&
		now.every(({ path, hash }, i) => path === checked[i].path && hash === checked[i].hash);
	if (!same)
		throw new DomainError(
			'conflict',
			'Somebody has changed the draft meanwhile. Look at it and publish again.'
		);
}

async function issuesOfNames({ courseId }: CourseDraft, content: CourseContent): Promise<Issue[]> {
	const elsewhere = await slugsElsewhere(courseId);
	const exercises = content.units.flatMap((unit) => unit.exercises);
	const twice = (names: { slug: string }[]) =>
		names.filter(({ slug }, i) => names.findIndex((one) => one.slug === slug) !== i);
	return [
		...content.units
			.filter(({ slug }) => elsewhere.units.has(slug))
			.map(({ slug }) => ({ field: slug, message: 'another course has a unit of this name' })),
		...exercises
			.filter(({ slug }) => elsewhere.exercises.has(slug))
			.map(({ slug }) => ({ field: slug, message: 'another course has an exercise of this name' })),
		...[...twice(exercises), ...twice(content.units)].map(({ slug }) => ({
			field: slug,
			message: 'stands twice in this course'
		}))
	];
}

/** Everything that a lesson may lead to: this course as it will be, and the others as they are. */
async function destinations(content: CourseContent) {
	const slugsOf = (table: string) =>
		sequelize.query<{ slug: string }>(`SELECT DISTINCT slug FROM ${table}`, { type: QueryTypes.SELECT });
	const [units, exercises] = [await slugsOf('units'), await slugsOf('exercises')];
	return {
		units: new Set([...units, ...content.units].map(({ slug }) => slug)),
		exercises: new Set(
			[...exercises, ...content.units.flatMap((unit) => unit.exercises)].map(({ slug }) => slug)
		)
	};
}

const issuesOfLinks = (content: CourseContent, known: Parameters<typeof linksIn>[1]): Issue[] =>
	content.units.flatMap(({ number, slug, lessonMarkdown }) =>
		linksIn(lessonMarkdown, known)
			.filter(({ problem }) => problem !== null)
			.map(({ href, problem }) => ({
				field: `unit ${number}, ${slug}`,
				message: `the link ${href}: ${problem}`
			}))
	);

async function issuesOfProofs({ courseId }: CourseDraft, contents: Contents): Promise<Issue[]> {
	const exercises = contents.filter(({ path }) => path.includes('/') && path.endsWith('.yaml'));
	const states = await exerciseStatesOf(courseId, exercises, new Set());
	return exercises.flatMap(({ path }, i) =>
		states[i] === 'proven' ? [] : [{ field: path, message: WHY[states[i]] }]
	);
}

const WHY: Record<string, string> = {
	failed: 'its proof has failed',
	proving: 'its proof is still running',
	draft: 'is not proven'
};
