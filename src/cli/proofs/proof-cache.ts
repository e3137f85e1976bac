/** Proofs that were made before, by content: under .data/proofs, thrown away by nobody's loss. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { deserialize, serialize } from 'node:v8';
import type { SeedProof } from '$lib/server/bench/proof/prove-seed';
import type { ProofTask } from '../parallel/task';
import { sourcesHash } from './sources-hash';

/** What proves a seed, and all that it rests on. */
const PROVER = 'src/lib/server/bench/proof/prove-exercise.ts';

/** What some seeds say, and the processor time it took to find out, s. */
export interface ProvenSeeds {
	proofs: SeedProof[];
	cpuS: number;
}

/** Proofs kept for these sources; an exercise that has changed since, or an engine, finds nothing. */
export class ProofCache {
	private readonly sources = sourcesHash(PROVER);

	constructor(private readonly folder = '.data/proofs') {}

	find(task: ProofTask): ProvenSeeds | undefined {
		const file = this.fileOf(task);
		return existsSync(file) ? (deserialize(readFileSync(file)) as ProvenSeeds) : undefined;
	}

	keep(task: ProofTask, proven: ProvenSeeds): void {
		const file = this.fileOf(task);
		mkdirSync(this.folder, { recursive: true });
		// Whoever reads meanwhile finds the whole or nothing.
		const own = `${file}.${process.pid}`;
		writeFileSync(own, serialize(proven));
		renameSync(own, file);
	}

	private fileOf({ file, fromSeed, seeds }: ProofTask): string {
		const text = readFileSync(file, 'utf8');
		const key = createHash('sha256').update(`${this.sources}\n${fromSeed}\n${seeds}\n${text}`).digest('hex');
		return join(this.folder, key);
	}
}
