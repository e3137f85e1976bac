/** Width of the band that a reading or a question is over, Hz; undefined when it isn't over one. */
export function widthHzOf(asked: { kind: string }): number | undefined {
	const { widthHz, startHz, stopHz } = asked as unknown as Record<string, number | undefined>;
	if (widthHz !== undefined) return widthHz;
	return startHz !== undefined && stopHz !== undefined ? stopHz - startHz : undefined;
}

/** Whether two widths are the same to a person who typed one of them: within 5 %. */
export const sameWidth = (a: number, b: number): boolean => Math.abs(Math.log(a / b)) < 0.05;
