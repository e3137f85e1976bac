/** Colour tokens for a canvas: read from CSS, and read again when day turns to night. */
import { createSubscriber } from 'svelte/reactivity';
import type { TraceStyle } from './trace-style';

/**
 * @param element gives the element whose colours count; nothing before it is mounted
 * @returns `of(token)`: the colour in force; reading it in an effect re-runs the effect when the scheme changes
 */
export function tokenColours(element: () => Element | undefined) {
	// Reading a style makes the browser work styles out anew, and a plot asks many times a frame.
	let known: Record<string, string> = {};
	const subscribe = createSubscriber((changed) => {
		const update = () => {
			known = {};
			changed();
		};
		known = {};
		const night = matchMedia('(prefers-color-scheme: dark)');
		night.addEventListener('change', update);
		const choice = new MutationObserver(update);
		choice.observe(document.documentElement, { attributes: true });
		return () => {
			night.removeEventListener('change', update);
			choice.disconnect();
		};
	});
	return {
		of(token: TraceStyle['token'] | 'ink'): string {
			subscribe();
			const target = element();
			if (!target) return '';
			const colour =
				known[token] ?? (getComputedStyle(target).getPropertyValue(`--${token}`).trim() || 'currentColor');
			known[token] = colour;
			return colour;
		}
	};
}
