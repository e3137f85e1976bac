import { chromium, type Browser, type Page } from '@playwright/test';

const PASSWORD = 'nine-quiet-carriers';
const MARKERS = 8;

/** Signs in, starts an exercise, and puts four traces and eight markers on a bench that sweeps fast. */
export async function openLoadedBench(
	origin: string,
	executablePath: string
): Promise<{ browser: Browser; page: Page }> {
	const browser = await chromium.launch({ executablePath });
	const page = await browser.newPage({ baseURL: origin, viewport: { width: 1440, height: 900 } });
	page.setDefaultTimeout(60_000);
	await page.addInitScript(watchDrawing);
	await page.goto('/sign-in?next=/learn');
	await page.getByLabel('E-mail address').fill('silas.arkle@tarnvale.example');
	await page.getByLabel('Password').fill(PASSWORD);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.getByRole('link', { name: /Channel power of a telemetry carrier/ }).click();
	await page.getByRole('button', { name: /^Start/ }).click();
	await page.getByText(/^Sweep \d+/).waitFor();
	await addTraces(page);
	await addMarkers(page);
	return { browser, page };
}

async function addTraces(page: Page): Promise<void> {
	for (let i = 0; i < 3; i++) {
		await page.getByRole('button', { name: 'Add a trace' }).click();
		await page.getByRole('button', { name: new RegExp(`Trace ${i + 2}`) }).waitFor();
	}
	await page.getByRole('button', { name: /Trace 2/ }).click();
	await page.getByLabel('Shows').selectOption('average');
	await page.keyboard.press('Escape');
}

async function addMarkers(page: Page): Promise<void> {
	const box = await page.getByRole('application').boundingBox();
	if (!box) throw new Error('The plot has no place on the page.');
	for (let i = 0; i < MARKERS; i++) {
		await page.mouse.dblclick(box.x + box.width * (0.12 + i * 0.1), box.y + box.height * 0.6);
		await page.getByRole('slider', { name: `Marker ${'ABCDEFGH'[i]}` }).waitFor();
	}
}

/** Notes, in the page, when a set-up was asked for and when the first new trace was painted after it. */
function watchDrawing(): void {
	const seen = { askedMs: 0, answered: false, paintedMs: [] as number[] };
	(window as unknown as { seen: typeof seen }).seen = seen;
	document.addEventListener(
		'keydown',
		({ key, timeStamp }) => {
			if (key === 'Enter') Object.assign(seen, { askedMs: timeStamp, answered: false });
		},
		true
	);
	const fetched = window.fetch;
	window.fetch = async (...given) => {
		const response = await fetched(...given);
		if (String(given[0]).endsWith('/sweeps')) seen.answered = true;
		return response;
	};
	const prototype = CanvasRenderingContext2D.prototype;
	// Called on whatever context it was taken from.
	const stroke = prototype.stroke as () => void;
	prototype.stroke = function (this: CanvasRenderingContext2D): void {
		stroke.call(this);
		if (!seen.answered || seen.askedMs === 0) return;
		const { askedMs } = seen;
		seen.askedMs = 0;
		requestAnimationFrame(() => seen.paintedMs.push(performance.now() - askedMs));
	} as typeof prototype.stroke;
}
