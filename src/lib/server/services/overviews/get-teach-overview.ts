import type { BenchLine as BenchLineView, TeachOverview } from '$lib/schemas/overview';
import {
	exerciseFigures,
	latestClosed,
	openSince,
	type BenchLine
} from '$lib/server/db/queries/bench-overview';
import { publishedOutline } from '$lib/server/db/queries/published-outline';
import { may } from '$lib/server/domain/policy';
import { refuseUnless } from '$lib/server/domain/refuse-unless';
import type { Actor } from '$lib/server/domain/role';

/** Somebody who has touched nothing for so long is not at the bench. */
const AT_BENCH_MS = 15 * 60_000;
const MOST_SHOWN = 20;

/** How the exercises go, who is at the bench and what was handed in last. Names only of those whose progress the actor may see. */
export async function getTeachOverview(actor: Actor, now: Date): Promise<TeachOverview> {
	refuseUnless(actor, 'teach.enter');
	const since = new Date(now.getTime() - AT_BENCH_MS);
	const [outline, figures, atBench, latest] = await Promise.all([
		publishedOutline(),
		exerciseFigures(),
		openSince(since, MOST_SHOWN),
		latestClosed(MOST_SHOWN)
	]);
	const present = (line: BenchLine) => presentLine(actor, line);
	return {
		exercises: outline.map(({ courseId, slug, title, unit, number }) => {
			const own = figures.find((candidate) => candidate.courseId === courseId && candidate.slug === slug);
			const { people, closed, passed, open } = own ?? { people: 0, closed: 0, passed: 0, open: 0 };
			return { slug, title, place: `${unit}.${number}`, people, closed, passed, open };
		}),
		atBench: atBench.map(present),
		latest: latest.map(present)
	};
}

function presentLine(actor: Actor, line: BenchLine): BenchLineView {
	const named = may(actor, 'progress.read', { ownerId: line.userId });
	return {
		attemptId: line.id,
		name: named ? line.displayName : null,
		exerciseTitle: line.exerciseTitle,
		number: line.number,
		at: line.at.toISOString(),
		passed: line.passed === null ? null : line.passed === 1
	};
}
