import adapter from '@sveltejs/adapter-node';
import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';

/** @type {import('@sveltejs/kit').Config} */
export default {
	preprocess: vitePreprocess(),
	kit: {
		// The tests build into a folder of their own, so that they never pull the files from under a running server.
		adapter: adapter({ out: process.env.BUILD_FOLDER ?? 'build' }),
		// lib/server/hooks/check-origin.ts checks more than kit does: every unsafe request, whatever its content type.
		csrf: { trustedOrigins: ['*'] },
		csp: {
			mode: 'nonce',
			directives: {
				'default-src': ['self'],
				'script-src': ['self'],
				'style-src': ['self'],
				'style-src-attr': ['unsafe-inline'],
				'img-src': ['self', 'data:', 'blob:'],
				'font-src': ['self'],
				'connect-src': ['self'],
				'object-src': ['none'],
				'base-uri': ['none'],
				'frame-ancestors': ['none'],
				'form-action': ['self']
			}
		},
		typescript: {
			config: (config) => {
				config.include.push('../migrations/**/*.ts', '../*.config.ts', '../*.config.js');
			}
		}
	}
};
