import { expect, test, type Page } from '@playwright/test';
import { collectFaults, expectAccessible, signIn } from './bench-page';
import { ready } from './ready';

test.setTimeout(120_000);

const lessonText = (page: Page) => page.getByRole('textbox', { name: 'The lesson’s text, Markdown' });
const expectKept = (page: Page) => expect(page.locator('[data-kept]')).toHaveAttribute('data-kept', 'true');

test('a lesson is written with its preview, two who save at once lose nothing, and its course is published', async ({
	browser,
	page
}) => {
	const faults = await collectFaults(page);
	await signIn(page, 'bridget.hale@tarnvale.example');
	await page.goto('/teach/courses');
	await ready(page);
	await page.getByLabel('Title', { exact: true }).fill('Tidal notes');
	await page.getByLabel('What it is about, in a sentence').fill('Levels by the water.');
	await page.getByLabel('Title of its first unit').fill('High water');
	await page.getByRole('button', { name: 'Begin this course' }).click();
	await expect(page).toHaveURL(/\/teach\/courses\/tidal-notes/);
	await page.getByRole('link', { name: 'Lesson' }).click();

	const preview = page.getByRole('region', { name: 'As an apprentice reads it' });
	await ready(page);
	await expect(preview.getByRole('heading', { name: 'High water' })).toBeVisible();
	await page.getByRole('button', { name: 'Insert a figure' }).click();
	await expect(preview.getByRole('figure')).toBeVisible({ timeout: 30_000 });
	await lessonText(page).press('Control+Home');
	await lessonText(page).pressSequentially('The **tide** lifts it.\n\n');
	await expect(preview.getByText('tide')).toBeVisible();
	await expectKept(page);
	await expectAccessible(page);

	const second = await browser.newContext();
	const other = await second.newPage();
	await signIn(other, 'silas.arkle@tarnvale.example');
	await other.goto(page.url());
	await ready(other);
	await expect(other.getByText(/Bridget Hale has this file open too/)).toBeVisible();
	await lessonText(other).press('Control+End');
	await lessonText(other).pressSequentially('And the ebb.');
	await expectKept(other);
	await lessonText(page).press('Control+Home');
	await lessonText(page).pressSequentially('Twice a day. ');
	await expect(page.getByText(/Silas Arkle has saved this file since/)).toBeVisible();
	await expect(page.getByRole('region', { name: 'Lines that differ' })).toContainText('And the ebb.');
	await page.getByRole('button', { name: 'Keep mine over it' }).click();
	await expectKept(page);
	await page.getByText('Earlier versions').click();
	await expect(page.getByText(/Silas Arkle, typed/)).toBeVisible();
	await second.close();

	await page.getByRole('link', { name: 'Tidal notes' }).click();
	await page.getByRole('button', { name: 'Publish edition 1' }).click();
	await expect(page.getByText('Edition 1 is published.')).toBeVisible({ timeout: 30_000 });
	await page.goto('/learn/units/high-water');
	await expect(page.getByText('Twice a day.')).toBeVisible();
	await expect(page.getByRole('figure')).toBeVisible();
	expect(faults).toEqual([]);
});
