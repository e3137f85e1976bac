import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import type { SeedProof } from '$lib/server/bench/proof/prove-seed';
import { ProofCache } from '../../../src/cli/proofs/proof-cache';
import { sourcesHash } from '../../../src/cli/proofs/sources-hash';

const folder = mkdtempSync(join(tmpdir(), 'proofs-'));
afterAll(() => rmSync(folder, { recursive: true }));
const write = (name: string, text: string): string => {
	const file = join(folder, name);
	mkdirSync(join(file, '..'), { recursive: true });
	writeFileSync(file, text);
	return file;
};

describe('sourcesHash(entry)', () => {
	const entry = write('a.ts', "import { b } from './deep/b';\nimport { z } from 'zod';\n");
	const at = (text: string): string => {
		write('deep/b.ts', text);
		return sourcesHash(entry);
	};

	it('is another when a module changes that is imported by one imported, and the same when it is put back', () => {
		write('deep/c.ts', 'export const c = 1;\n');
		const through = "export * from './c';\n";
		const before = at(through);
		write('deep/c.ts', 'export const c = 2;\n');
		expect(at(through)).not.toBe(before);
		write('deep/c.ts', 'export const c = 1;\n');
		expect(at(through)).toBe(before);
	});

	it('takes no account of modules that nobody imports', () => {
		const before = at('export const b = 1;\n');
		write('deep/other.ts', 'export const d = 3;\n');
		expect(at('export const b = 1;\n')).toBe(before);
	});
});

describe('ProofCache', () => {
	const cache = new ProofCache(join(folder, 'kept'));
	const file = write('exercise.yaml', 'slug: one\n');
	const task = { do: 'prove', file, fromSeed: 1, seeds: 1 } as const;
	const nearest = [{ question: 'q', spreads: Infinity }];
	const proof: SeedProof = { seed: 1, redraws: 0, outcomes: [], nearest, tooTight: [] };

	it('gives back what it was given, distances without end too', () => {
		expect(cache.find(task)).toBeUndefined();
		cache.keep(task, { proofs: [proof], cpuS: 2.5 });
		expect(cache.find(task)).toEqual({ proofs: [proof], cpuS: 2.5 });
	});

	it('has nothing of other seeds, nor of another text', () => {
		expect(cache.find({ ...task, fromSeed: 2 })).toBeUndefined();
		write('exercise.yaml', 'slug: two\n');
		expect(cache.find(task)).toBeUndefined();
	});
});
