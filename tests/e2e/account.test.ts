import { expect, test, type Page } from '@playwright/test';
import { expectAccessible } from './bench-page';
import { rawRequest } from './raw-request';
import { ready } from './ready';

const own = process.env.E2E_ORIGIN ?? '';
const PASSWORD = 'nine-quiet-carriers';

async function openAccount(page: Page, email: string, password = PASSWORD): Promise<void> {
	await page.goto('/sign-in?next=/account');
	await page.getByLabel('E-mail address').fill(email);
	await page.getByLabel('Password').fill(password);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page).toHaveURL('/account');
	await ready(page);
}

async function changePassword(page: Page, present: string, wanted: string, again = wanted): Promise<void> {
	await page.getByLabel('Present password').fill(present);
	await page.getByLabel('New password', { exact: true }).fill(wanted);
	await page.getByLabel('New password again').fill(again);
	await page.getByRole('button', { name: 'Change the password' }).click();
}

test('name, password and sessions are changed by their owner, and what is refused says why', async ({
	page,
	browser
}) => {
	test.slow();
	const email = 'piers.langrigg@skerrycoast.example';
	await openAccount(page, email);
	await page.getByLabel('Name shown').fill('  ');
	await page.getByRole('button', { name: 'Change the name' }).click();
	await expect(page.getByLabel('Name shown')).toHaveAccessibleDescription('Give a name.');
	await page.getByLabel('Name shown').fill('Piers M. Langrigg');
	await page.getByRole('button', { name: 'Change the name' }).click();
	await expect(page.getByRole('banner')).toContainText('Piers M. Langrigg');

	const elsewhere = await (await browser.newContext({ baseURL: own })).newPage();
	await openAccount(elsewhere, email);
	await page.reload();
	await ready(page);
	await page.getByRole('button', { name: /^End the session/ }).click();
	await expect(page.getByRole('alert')).toHaveText('The session has ended.');
	await elsewhere.reload();
	await expect(elsewhere).toHaveURL(/sign-in/);
	await elsewhere.context().close();

	await changePassword(page, 'wrong', 'six steady sweeps');
	await expect(page.getByLabel('Present password')).toHaveAccessibleDescription(/not the password/);
	await expectAccessible(page);
	await changePassword(page, PASSWORD, 'six steady sweeps');
	await expect(page.getByRole('alert')).toContainText('The password is changed');
	await page.getByRole('button', { name: 'Sign out everywhere' }).click();
	await expect(page).toHaveURL('/sign-in');
});

test.describe('without a script', () => {
	test.use({ javaScriptEnabled: false, viewport: { width: 390, height: 844 } });

	test('the account’s forms keep what was typed, name the field, and never break', async ({
		page,
		context
	}) => {
		await page.goto('/sign-in?next=/account');
		await page.getByLabel('E-mail address').fill('tobin.garth@tarnvale.example');
		await page.getByLabel('Password').fill(PASSWORD);
		await page.getByRole('button', { name: 'Sign in' }).click();
		await page.getByLabel('Name shown').fill('x'.repeat(121));
		await page.getByRole('button', { name: 'Change the name' }).click();
		await expect(page.getByLabel('Name shown')).toHaveValue('x'.repeat(121));
		await expect(page.getByLabel('Name shown')).toHaveAccessibleDescription(/longer than 120/);
		expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
		await changePassword(page, PASSWORD, 'short');
		await expect(page.getByLabel('New password', { exact: true })).toHaveAccessibleDescription(
			/12 characters/
		);

		const session = (await context.cookies()).find(({ name }) => name === 'session')?.value ?? '';
		const urlencoded = 'application/x-www-form-urlencoded';
		const bad = [
			['name', '', urlencoded],
			['name', 'displayName=a&displayName=', urlencoded],
			[
				'name',
				'--x\r\ncontent-disposition: form-data; name="displayName"; filename="a"\r\n\r\na\r\n--x--\r\n',
				'multipart/form-data; boundary=x'
			],
			['password', 'presentPassword=a', urlencoded],
			['password', `presentPassword=${'a'.repeat(2000)}&newPassword=b&newPasswordAgain=b`, urlencoded],
			['end', 'session=-1', urlencoded],
			['end', 'session=999999999999999', urlencoded],
			['end', 'session=1&session=DROP', urlencoded],
			['name', '{"displayName":"a"}', 'application/json']
		];
		for (const [action, body, type] of bad) {
			const headers = {
				origin: own,
				cookie: `session=${session}`,
				'content-type': type,
				accept: 'text/html'
			};
			const { status } = await rawRequest('POST', `/account?/${action}`, headers, body);
			expect(status, `${action} ${body.slice(0, 40)}`).toBeGreaterThanOrEqual(400);
			expect(status, `${action} ${body.slice(0, 40)}`).toBeLessThan(500);
		}
		await page.reload();
		await expect(page.getByLabel('Name shown')).toHaveValue('Tobin Garth');
	});
});
