/** Hands a file to the browser to be kept. */

/** "Channel power, 6.1" → "channel-power-6-1" */
export const fileName = (...parts: string[]): string =>
	parts
		.join(' ')
		.toLowerCase()
		.replace(/[^a-z0-9]+/g, '-')
		.replace(/^-+|-+$/g, '')
		.slice(0, 80);

export function saveFile(name: string, content: Blob | string, type = 'text/plain'): void {
	const blob = typeof content === 'string' ? new Blob([content], { type }) : content;
	const url = URL.createObjectURL(blob);
	const link = document.createElement('a');
	link.href = url;
	link.download = name;
	link.click();
	// The browser has taken hold of it by the next task; kept longer it would stay in memory with the page.
	setTimeout(() => URL.revokeObjectURL(url), 10_000);
}
