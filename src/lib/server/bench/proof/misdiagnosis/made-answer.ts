import type { Verdict } from '$lib/schemas/questions/finding';

/** How a person leaves what an answer rests on. */
export const evidences = ['attached', 'not attached', 'no reading'] as const;
export type EvidenceLeft = (typeof evidences)[number];

/** One answer made on the bench, and what the grader said of it. */
export interface MadeAnswer {
	/** Number of the answer: makes it again. */
	answer: number;
	question: string;
	/** The mistake that was made; null where none was. */
	mistake: string | null;
	evidence: EvidenceLeft;
	/** Null when it could not be made: `problem` says why. */
	verdict: Verdict | null;
	problem?: string;
	/** What the finding names. */
	found: string[];
}
