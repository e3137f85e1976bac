import adapter from '@sveltejs/adapter-node';
import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';

/** @type {import('@sveltejs/kit').Config} */
export default {
	preprocess: vitePreprocess(),
	kit: {
		// The tests build into a folder of their own, so that they never pull the files from under a running server.
		adapter: adapter({ out: process.env.BUILD_FOLDER ?? 'build' }),
		typescript: {
			config: (config) => {
				config.include.push('../migrations/**/*.ts', '../*.config.ts', '../*.config.js');
			}
		}
	}
};
