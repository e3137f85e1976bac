import { ThreadPool } from '../process/thread-pool';
import type { DeskTask, DeskWork } from './desk-worker';

const load = () => import('./desk-worker');
/** An author waits for these, so that no proof stands before them. */
const atDesk = new ThreadPool<DeskTask, unknown>('desk', load, 1);
const proving = new ThreadPool<DeskTask, unknown>('desk', load);

/** How many proofs run at once in this process. */
export const PROVING_THREADS = proving.most;

/** Has the bench do something for an author in a thread. @throws what is no refusal */
export const askBench = <K extends keyof DeskWork>(
	what: K,
	asked: DeskWork[K]['asked']
): Promise<DeskWork[K]['answer']> =>
	atDesk.ask({ do: what, ...asked } as DeskTask) as Promise<DeskWork[K]['answer']>;

/** The same for what nobody waits for. */
export const askBenchLater = <K extends keyof DeskWork>(
	what: K,
	asked: DeskWork[K]['asked']
): Promise<DeskWork[K]['answer']> =>
	proving.ask({ do: what, ...asked } as DeskTask) as Promise<DeskWork[K]['answer']>;
