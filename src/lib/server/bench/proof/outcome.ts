/** What one seed says of one way to answer one question. */
export interface Outcome {
	question: string;
	/** A mistake's id; null for the taught method. */
	mistake: string | null;
	/** Answered − true, in the question's unit; null when it could not be done on the bench, and of what is no number. */
	error: number | null;
	/** What of the error is not this receiver's own: over the seeds, nothing should be left of it. */
	bias: number;
	/** One standard deviation of the reading answered from; of a mistake, what theory leaves open where that is less. */
	spread: number;
	/** Within the tolerance; right. */
	passes: boolean;
	/** The finding named this mistake and no other; for the taught method, it found nothing wrong. */
	named: boolean;
	/** Why it could not be done on the bench. */
	problem?: string;
}

export interface QuestionProof {
	outcomes: Outcome[];
	/** By question: spreads between the two mistakes' outcomes that lie nearest to each other. */
	nearest: { question: string; spreads: number }[];
	/** Tolerances that the receiver's own error and three spreads don't fit into. */
	tooTight: { question: string; least: number }[];
}
