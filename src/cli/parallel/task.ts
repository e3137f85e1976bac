/** What a worker can be asked to do, and what it answers. */
import type { MadeAnswer } from '$lib/server/bench/proof/misdiagnosis/made-answer';
import type { SeedProof } from '$lib/server/bench/proof/prove-seed';

export interface ProofTask {
	do: 'prove';
	/** Path of the exercise's file. */
	file: string;
	fromSeed: number;
	seeds: number;
}
export interface MisdiagnosisTask {
	do: 'misdiagnose';
	file: string;
	fromAnswer: number;
	answers: number;
}
export type Task = ProofTask | MisdiagnosisTask;
export type Answer<T extends Task> = T extends ProofTask ? SeedProof[] : MadeAnswer[];
