/** How earlier states are drawn, the last first: in pencil, told apart by their dashes. */
export const earlierStyles: readonly { dash: string; widthPx: number }[] = [
	{ dash: '6 3', widthPx: 1.1 },
	{ dash: '1.5 3', widthPx: 1.3 }
];
