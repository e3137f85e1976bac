import { sveltekit } from '@sveltejs/kit/vite';
import { svelte } from '@sveltejs/vite-plugin-svelte';
import tailwindcss from '@tailwindcss/vite';
import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const lib = fileURLToPath(new URL('./src/lib', import.meta.url));
const pureRooms = ['units', 'measure', 'schemas', 'server/bench', 'server/domain'];

export default defineConfig({
	plugins: process.env.VITEST ? [] : [tailwindcss(), sveltekit()],
	test: {
		expect: { requireAssertions: true },
		// Vitest leaves a core free, which on two cores is half of them.
		maxWorkers: Math.max(2, availableParallelism() - 1),
		coverage: {
			provider: 'v8',
			include: pureRooms.map((room) => `src/lib/${room}/**/*.ts`),
			reporter: ['text-summary', 'json-summary'],
			reportsDirectory: '.data/test/coverage'
		},
		projects: [
			{
				plugins: [svelte()],
				resolve: { alias: { $lib: lib } },
				test: {
					name: 'unit',
					environment: 'node',
					include: ['tests/unit/**/*.test.ts', 'tests/*.test.ts'],
					// These rooms keep nothing but what is the same for everyone, so that files may share what they import.
					isolate: false,
					// what reads the whole tree or proves a law takes its time on a busy machine
					testTimeout: 60_000
				}
			},
			{
				resolve: { alias: { $lib: lib } },
				test: {
					name: 'reference',
					environment: 'node',
					include: ['tests/reference/**/*.test.ts'],
					isolate: false,
					testTimeout: 60_000
				}
			},
			{
				plugins: [sveltekit()],
				test: {
					name: 'integration',
					environment: 'node',
					include: ['tests/integration/**/*.test.ts'],
					globalSetup: ['tests/integration/database-server.ts'],
					setupFiles: ['tests/integration/own-schema.ts'],
					testTimeout: 30_000,
					hookTimeout: 60_000
				}
			}
		]
	}
});
