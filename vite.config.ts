import { fileURLToPath } from 'node:url';
import { sveltekit } from '@sveltejs/kit/vite';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vitest/config';

const lib = fileURLToPath(new URL('./src/lib', import.meta.url));

export default defineConfig({
	plugins: process.env.VITEST ? [] : [tailwindcss(), sveltekit()],
	test: {
		expect: { requireAssertions: true },
		projects: [
			{
				resolve: { alias: { $lib: lib } },
				test: { name: 'unit', environment: 'node', include: ['tests/unit/**/*.test.ts', 'tests/*.test.ts'] }
			},
			{
				resolve: { alias: { $lib: lib } },
				test: { name: 'reference', environment: 'node', include: ['tests/reference/**/*.test.ts'], testTimeout: 60_000 }
			}
		]
	}
});
