import type { CDPSession, Page } from '@playwright/test';

interface TraceEvent {
	name: string;
	pid: number;
	tid: number;
	/** µs */
	ts: number;
	dur?: number;
	/** Processor time of its thread, µs. */
	tdur?: number;
	args?: { name?: string };
}
export interface FrameWork {
	processorMs: number[];
	wallMs: number[];
}

/** Traces the page for `ms` and sums, frame by frame, what its main thread did. */
export async function frameWorkMs(page: Page, ms: number): Promise<FrameWork> {
	const session = await page.context().newCDPSession(page);
	const events: TraceEvent[] = [];
	session.on('Tracing.dataCollected', ({ value }) => events.push(...(value as unknown as TraceEvent[])));
	await session.send('Tracing.start', {
		transferMode: 'ReportEvents',
		traceConfig: {
			includedCategories: [
				'__metadata',
				'disabled-by-default-devtools.timeline',
				'disabled-by-default-devtools.timeline.frame',
				'devtools.timeline',
				'devtools.timeline.frame',
				'toplevel'
			]
		}
	});
	await page.waitForTimeout(ms);
	await endTracing(session);
	return workPerFrame(events);
}

async function endTracing(session: CDPSession): Promise<void> {
	const complete = new Promise<void>((resolve) => session.once('Tracing.tracingComplete', () => resolve()));
	await session.send('Tracing.end');
	await complete;
}

/** A frame lasts from one start of the main thread's frame to the next; its work is the tasks that begin in it. */
export function workPerFrame(events: readonly TraceEvent[]): FrameWork {
	const threadOf = ({ pid, tid }: TraceEvent) => `${pid} ${tid}`;
	const mains = new Set(
		events.filter(({ name, args }) => name === 'thread_name' && args?.name === 'CrRendererMain').map(threadOf)
	);
	const starts = events.filter(
		(event) => event.name === 'BeginMainThreadFrame' && mains.has(threadOf(event))
	);
	const counts = new Map<string, number>();
	for (const start of starts) counts.set(threadOf(start), (counts.get(threadOf(start)) ?? 0) + 1);
	const busiest = [...counts].sort(([, a], [, b]) => b - a)[0]?.[0];
	const times = starts
		.filter((start) => threadOf(start) === busiest)
		.map(({ ts }) => ts)
		.sort((a, b) => a - b);
	const tasks = events.filter((event) => event.name === 'RunTask' && threadOf(event) === busiest);
	const work: FrameWork = {
		processorMs: times.slice(1).map(() => 0),
		wallMs: times.slice(1).map(() => 0)
	};
	for (const { ts, dur = 0, tdur } of tasks) {
		const frame = times.findLastIndex((start) => start <= ts + dur);
		if (frame < 0 || frame >= work.wallMs.length) continue;
		work.wallMs[frame] += dur / 1000;
		work.processorMs[frame] += (tdur ?? dur) / 1000;
	}
	return work;
}
