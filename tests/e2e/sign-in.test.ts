import { expect, test, type Page } from '@playwright/test';
import { collectFaults, expectAccessible } from './bench-page';
import { rawRequest } from './raw-request';
import { personMenu, ready } from './ready';

const PASSWORD = 'nine-quiet-carriers';
const own = process.env.E2E_ORIGIN ?? '';

async function signIn(page: Page, email: string, password = PASSWORD): Promise<void> {
	await page.getByLabel('E-mail address').fill(email);
	await page.getByLabel('Password').fill(password);
	await page.getByRole('button', { name: 'Sign in' }).click();
}

const homes: [string, string, string][] = [
	['instructor', 'bridget.hale@tarnvale.example', '/teach'],
	['coordinator', 'morwenna.slee@tarnvale.example', '/office'],
	['company contact', 'una.calder@northmoor.example', '/company'],
	['administrator', 'greta.scarth@tarnvale.example', '/admin']
];

for (const [role, email, home] of homes) {
	test(`a ${role} signs in, arrives at ${home}, and signs out`, async ({ page }) => {
		const faults = await collectFaults(page);
		await page.goto('/sign-in');
		await signIn(page, email);
		await expect(page).toHaveURL(home);
		await expect(page.getByRole('main')).toContainText(role);
		await personMenu(page).click();
		await page.getByRole('button', { name: 'Sign out' }).click();
		await expect(page).toHaveURL('/');
		await page.goto(home);
		await expect(page).toHaveURL(`/sign-in?next=${encodeURIComponent(home)}`);
		expect(faults).toEqual([]);
	});
}

test('an apprentice signs in and is sent to /learn', async ({ page }) => {
	await page.goto('/sign-in');
	await signIn(page, 'ewan.brack@skerrycoast.example');
	await expect(page).toHaveURL('/learn');
});

test('the page that was asked for comes after signing in, another site never', async ({ page }) => {
	await page.goto('/admin?a=1');
	await signIn(page, 'owen.mell@tarnvale.example');
	await expect(page).toHaveURL('/admin?a=1');
	await page.goto('/sign-in?next=//evil.example');
	await expect(page).toHaveURL('/admin');
});

test('a room that is not for one’s role says so, with a way back', async ({ page }) => {
	await page.goto('/sign-in?next=/admin');
	await signIn(page, 'tobin.garth@tarnvale.example');
	await expect(page.getByRole('heading', { name: 'Not for your role' })).toBeVisible();
	await page.getByRole('link', { name: 'Back to Office' }).click();
	await expect(page).toHaveURL('/office');
});

test('a wrong password keeps the address, says why, and is read out', async ({ page }) => {
	await page.goto('/sign-in');
	await signIn(page, 'silas.arkle@tarnvale.example', 'wrong');
	await expect(page.getByRole('alert')).toHaveText('This e-mail address and password don’t belong together.');
	await expect(page.getByLabel('E-mail address')).toHaveValue('silas.arkle@tarnvale.example');
	await expectAccessible(page);
});

test('empty fields are named', async ({ page }) => {
	await page.goto('/sign-in');
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page.getByLabel('E-mail address')).toHaveAccessibleDescription(
		'Give the e-mail address of your account.'
	);
	await expect(page.getByLabel('Password')).toHaveAccessibleDescription('Give your password.');
	await expectAccessible(page);
});

test('it all works from the keyboard', async ({ page }) => {
	await page.goto('/sign-in');
	await page.keyboard.press('Tab');
	await expect(page.getByRole('link', { name: 'Skip to the page' })).toBeFocused();
	await page.keyboard.press('Enter');
	await page.keyboard.press('Tab');
	await page.keyboard.type('greta.scarth@tarnvale.example');
	await page.keyboard.press('Tab');
	await page.keyboard.type(PASSWORD);
	await page.keyboard.press('Enter');
	await expect(page).toHaveURL('/admin');
	const menu = personMenu(page);
	await menu.focus();
	await page.keyboard.press('Enter');
	await expect(page.getByRole('button', { name: 'Sign out' })).toBeVisible();
	await page.keyboard.press('Escape');
	await expect(page.getByRole('button', { name: 'Sign out' })).toBeHidden();
	await expect(menu).toBeFocused();
	await ready(page);
	await page.keyboard.press('Enter');
	await page.keyboard.press('Tab');
	await expect(page.getByRole('banner').getByRole('link', { name: 'Learn' })).toBeFocused();
	await page.keyboard.press('Shift+Tab');
	await expect(menu).toBeFocused();
	await page.keyboard.press('Shift+Tab');
	await expect(page.getByRole('button', { name: 'Sign out' })).toBeHidden();
});

test.describe('without a script', () => {
	test.use({ javaScriptEnabled: false });

	test('signing in, the colour scheme and signing out work', async ({ page }) => {
		await page.goto('/sign-in');
		await page.getByRole('button', { name: 'Night scheme' }).click();
		await expect(page).toHaveURL('/sign-in');
		await expect(page.locator('html')).toHaveAttribute('data-scheme', 'night');
		await signIn(page, 'morwenna.slee@tarnvale.example');
		await expect(page).toHaveURL('/office');
		await personMenu(page).click();
		await page.keyboard.press('Escape');
		await expect(page.getByRole('button', { name: 'Sign out' })).toBeHidden();
		await personMenu(page).click();
		await page.getByRole('button', { name: 'Sign out' }).click();
		await expect(page).toHaveURL('/');
	});
});

test('the colour scheme changes at once, stays, and asks for nothing', async ({ page }) => {
	const faults = await collectFaults(page);
	await page.goto('/');
	const ground = () => page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
	expect(await ground()).toBe('rgb(251, 249, 244)');
	const requests: string[] = [];
	await ready(page);
	page.on('request', (request) => requests.push(request.url()));
	await page.getByRole('button', { name: 'Night scheme' }).click();
	expect(await ground()).toBe('rgb(36, 40, 44)');
	expect(requests).toEqual([]);
	await page.reload();
	await ready(page);
	expect(await ground()).toBe('rgb(36, 40, 44)');
	await page.getByRole('button', { name: 'Day scheme' }).click();
	await page.reload();
	expect(await ground()).toBe('rgb(251, 249, 244)');
	expect(faults).toEqual([]);
});

for (const colorScheme of ['light', 'dark'] as const) {
	for (const width of [1440, 1024, 390]) {
		test.describe(`at ${width} px, ${colorScheme}`, () => {
			test.use({ colorScheme, viewport: { width, height: 844 } });
			// every-page.test.ts looks closely at wide pages, by day and by night.
			const closely = width === 390 && colorScheme === 'dark';

			test(`nothing runs off the side${closely ? ', and pages are accessible' : ''}`, async ({ page }) => {
				test.slow();
				const faults = await collectFaults(page);
				const look = async () => {
					const overflowPx = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
					expect(overflowPx).toBeLessThanOrEqual(0);
					if (closely) await expectAccessible(page);
				};
				for (const path of ['/', '/nothing/here', '/sign-in']) {
					await page.goto(path);
					await look();
				}
				await signIn(page, 'owen.mell@tarnvale.example');
				await expect(page).toHaveURL('/admin');
				await personMenu(page).click();
				await look();
				expect(faults).toEqual([]);
			});
		});
	}
}

test('the session’s token is in its cookie and nowhere else', async ({ page, context }) => {
	const bodies: Promise<string>[] = [];
	page.on('response', (response) => {
		if (response.status() < 300) bodies.push(response.text().catch(() => ''));
	});
	await page.goto('/sign-in');
	await signIn(page, 'silas.arkle@tarnvale.example');
	await expect(page).toHaveURL('/teach');
	await page.reload();
	const cookie = (await context.cookies()).find(({ name }) => name === 'session');
	expect(cookie).toMatchObject({ httpOnly: true, sameSite: 'Lax', path: '/', secure: false });
	expect(cookie?.value).toMatch(/^[a-z2-7]{32}$/);
	const everything = (await Promise.all(bodies)).join('\n') + (await page.content()) + page.url();
	expect(everything).toContain('Silas Arkle');
	expect(everything).not.toContain(cookie?.value);
	expect(await page.evaluate(() => document.cookie)).not.toContain('session');
});

test('a cookie that was planted is not taken up, and one that has been signed out opens nothing', async ({
	page,
	context
}) => {
	const planted = 'a'.repeat(32);
	await context.addCookies([{ name: 'session', value: planted, url: own }]);
	await page.goto('/sign-in');
	await signIn(page, 'silas.arkle@tarnvale.example');
	await expect(page).toHaveURL('/teach');
	const token = (await context.cookies()).find(({ name }) => name === 'session')?.value ?? '';
	expect(token).not.toBe(planted);
	const pageOf = async (value: string) =>
		(await rawRequest('GET', '/teach', { cookie: `session=${value}` })).status;
	expect(await pageOf(token)).toBe(200);
	expect(await pageOf(planted)).toBe(303);
	await personMenu(page).click();
	await page.getByRole('button', { name: 'Sign out' }).click();
	await expect(page).toHaveURL('/');
	expect(await pageOf(token)).toBe(303);
});

test('an unknown address gets the very response of a known one', async () => {
	const respond = (email: string) =>
		rawRequest(
			'POST',
			'/sign-in',
			{
				origin: own,
				'content-type': 'application/x-www-form-urlencoded',
				'x-sveltekit-action': 'true',
				accept: 'application/json'
			},
			new URLSearchParams({ email, password: 'wrong' }).toString()
		);
	const known = await respond('una.calder@northmoor.example');
	const unknown = await respond('nobody.atall@northmoor.example');
	const same = ({ status, headers, body }: typeof known, email: string) => ({
		status,
		names: Object.keys(headers).sort(),
		body: body.replace(email, 'ADDRESS')
	});
	expect(same(unknown, 'nobody.atall@northmoor.example')).toEqual(
		same(known, 'una.calder@northmoor.example')
	);
	expect(known.headers['set-cookie']).toBeUndefined();
});

test('too many tries are answered with 429 and when to come back', async ({ page }) => {
	const email = `somebody-${Date.now()}@overwater.example`;
	const body = new URLSearchParams({ email, password: 'wrong' }).toString();
	const headers = { origin: own, 'content-type': 'application/x-www-form-urlencoded', accept: 'text/html' };
	const statuses: number[] = [];
	let last;
	for (let i = 0; i < 12; i += 1) {
		last = await rawRequest('POST', '/sign-in', headers, body);
		statuses.push(last.status);
	}
	expect(statuses).toEqual([...Array<number>(10).fill(422), 429, 429]);
	expect(Number(last?.headers['retry-after'])).toBeGreaterThan(0);
	expect(Number(last?.headers['retry-after'])).toBeLessThanOrEqual(30);
	await page.goto('/sign-in');
	await signIn(page, email);
	await expect(page.getByRole('alert')).toContainText(/The next one is possible in \d+ s/);
});
