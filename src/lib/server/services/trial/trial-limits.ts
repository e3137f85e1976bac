import { ShareByAddress } from '../process/share-by-address';

/** A classroom behind one address may look at once, and nobody can have the receiver to himself. */
export const trialSweeps = new ShareByAddress('sweeps', { capacity: 120, drainS: 1 / 20 });
/** An answer is graded, which takes as much work as some hundred sweeps. */
export const trialAnswers = new ShareByAddress('answers', { capacity: 10, drainS: 6 });
