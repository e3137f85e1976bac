/** Every page there is, looked at closely in both schemes. A page that the table doesn't name fails it. */
import { readdirSync } from 'node:fs';
import { dirname } from 'node:path';
import { expect, test, type Page } from '@playwright/test';
import {
	ask,
	collectFaults,
	expectAccessible,
	expectSweeping,
	readingRow,
	setUp,
	signIn,
	startAttempt,
	startReading
} from './bench-page';
import { personMenu, ready } from './ready';

test.setTimeout(240_000);

/** Opens a page as somebody who may see it, up to where it stands still. */
type Open = (page: Page) => Promise<void>;

const plain =
	(path: string): Open =>
	async (page) => {
		await page.goto(path);
		await ready(page);
	};

/** A page of an attempt that has been given up, which has everything that any closed attempt has. */
const ofClosed =
	(part: string): Open =>
	async (page) => {
		const { id } = await startAttempt(page, 'power-behind-a-coupler');
		await ask(page, `/api/attempts/${id}/abandonment`);
		await plain(`/learn/attempts/${id}/${part}`)(page);
	};

async function openBench(page: Page): Promise<void> {
	const { id } = await startAttempt(page, 'two-carriers-or-one');
	await page.goto(`/learn/attempts/${id}`);
	await expectSweeping(page);
	const channel = '450.025 MHz';
	await setUp(page, 'Centre', channel);
	await page.getByRole('button', { name: 'Marker', exact: true }).click();
	await startReading(page, 'Channel power', { Centre: channel, Width: '25k' });
	await expect(readingRow(page, 'Channel power, 25')).toBeVisible();
	// A bench that sweeps changes under the eyes of whoever looks closely.
	await page.getByRole('button', { name: 'Stop' }).click();
}

async function openLogbookEntry(page: Page): Promise<void> {
	const { id } = await startAttempt(page, 'two-carriers-or-one');
	await ask(page, `/api/attempts/${id}/logbook`, { kind: 'set-up' });
	await page.goto('/learn/logbook');
	await page.locator('main a[href^="/learn/logbook/"]:not([href*="csv"], [href*="pdf"])').first().click();
	await expect(page).toHaveURL(/logbook\/\d+$/);
	await ready(page);
}

/** A page of the desk, which is there once the course's draft has been begun. */
const ofDraft =
	(part: string): Open =>
	async (page) => {
		const begun = await page.context().request.post('/teach/courses?/start', {
			form: { course: 'spectrum-measurement' },
			headers: { origin: process.env.E2E_ORIGIN ?? '', accept: 'text/html' }
		});
		expect(begun.ok()).toBe(true);
		await plain(`/teach/courses/spectrum-measurement${part}`)(page);
	};

const PAGES: Record<string, Open> = {
	'/': plain('/'),
	'/account': plain('/account'),
	'/admin': plain('/admin'),
	'/company': plain('/company'),
	'/learn': plain('/learn'),
	'/learn/attempts/[id]': openBench,
	'/learn/attempts/[id]/done-right': ofClosed('done-right'),
	'/learn/attempts/[id]/finding': ofClosed('finding'),
	'/learn/attempts/[id]/report': ofClosed('report'),
	'/learn/exercises/[slug]': plain('/learn/exercises/power-behind-a-coupler'),
	'/learn/find': plain('/learn/find?q=marker'),
	'/learn/glossary': plain('/learn/glossary'),
	'/learn/logbook': plain('/learn/logbook'),
	'/learn/logbook/[id]': openLogbookEntry,
	'/learn/skills': plain('/learn/skills'),
	'/learn/units/[slug]': plain('/learn/units/power-of-a-spread-signal'),
	'/office': plain('/office'),
	'/sign-in': async (page) => {
		await page.context().clearCookies();
		await plain('/sign-in')(page);
	},
	'/teach': plain('/teach'),
	'/teach/courses': plain('/teach/courses'),
	'/teach/courses/[course]': ofDraft(''),
	'/teach/courses/[course]/[unit]/[file]': ofDraft('/01-connect-safely/power-behind-a-coupler.yaml')
};

const routes = readdirSync('src/routes', { recursive: true, encoding: 'utf8' })
	.filter((file) => file.endsWith('+page.svelte'))
	.map((file) => `/${dirname(file)}`.replace(/\/(\.|\([^)]+\))(?=\/|$)/g, '') || '/');

test('the table names every page that there is, and no other', () => {
	expect(Object.keys(PAGES).sort()).toEqual(routes.sort());
});

for (const [route, open] of Object.entries(PAGES)) {
	test(`${route} is without violations of accessibility and of the content policy, by day and by night`, async ({
		page
	}) => {
		const faults = await collectFaults(page);
		await page.emulateMedia({ reducedMotion: 'reduce', colorScheme: 'light' });
		await signIn(page, 'owen.mell@tarnvale.example');
		await open(page);
		await expectAccessible(page);
		await page.emulateMedia({ colorScheme: 'dark' });
		if (await personMenu(page).isVisible()) await personMenu(page).click();
		await expectAccessible(page);
		expect(faults).toEqual([]);
	});
}
