import { defineConfig, devices } from '@playwright/test';
import { fileURLToPath } from 'node:url';

const origin = process.env.E2E_ORIGIN;
if (!origin)
	throw new Error(
		'E2E_ORIGIN is not set: run the browser tests with `npm run test:e2e`, which starts a server.'
	);

const inData = (name: string) => fileURLToPath(new URL(`../../.data/test/${name}`, import.meta.url));

export default defineConfig({
	testDir: '.',
	outputDir: inData('browser'),
	forbidOnly: true,
	retries: 0,
	workers: 2,
	timeout: 60_000,
	expect: { timeout: 10_000 },
	reporter: [['list'], ['json']],
	use: {
		baseURL: origin,
		screenshot: 'only-on-failure',
		// A trace of each action takes a quarter of the processor's time: `npm run test:e2e -- NAME --trace on` where one is wanted.
		trace: 'off',
		launchOptions: { executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium' }
	},
	projects: [{ name: 'chromium', use: { ...devices['Desktop Chrome'] } }]
});
