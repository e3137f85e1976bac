/** Something in a course can't be published: "harbour/06-power/spread.yaml:12: questions[0].unit: …". */
export class ContentError extends Error {
	override name = 'ContentError';
	constructor(
		/** Path from the folder that holds the course's own folder. */
		readonly file: string,
		readonly line: number,
		readonly field: string,
		readonly reason: string
	) {
		super(`${file}:${line}: ${field ? `${field}: ` : ''}${reason}`);
	}
}
