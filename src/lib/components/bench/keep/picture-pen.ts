/** Fonts and colours of a kept picture. A canvas inherits neither from the page. */
export const textFont = (px: number, weight = 400): string =>
	`${weight} ${px}px "Spline Sans Variable", sans-serif`;
export const figureFont = (px: number, weight = 400): string =>
	`${weight} ${px}px "Spline Sans Mono Variable", monospace`;

/** The colour of a token, as the page has it now. */
export type TokenColour = (token: string) => string;

export const pageColours = (element: Element): TokenColour => {
	const style = getComputedStyle(element);
	return (token) => style.getPropertyValue(`--${token}`).trim();
};
